import { and, eq, sql } from 'drizzle-orm'
import { AppError } from '#shared/errors.ts'
import { refusal } from '#shared/messages/refusals.ts'
import { logActivity } from '../activity/log-activity.ts'
import { orderLine, sellerTally } from '../db/schema/orders.ts'
import { refund } from '../db/schema/payments.ts'
import { seller } from '../db/schema/sellers.ts'
import { inTransaction, type Tx } from '../db/transaction.ts'
import type { Deps } from '../deps.ts'
import { findOrder, listLines, type OrderLineRow, type OrderRow } from './queries.ts'
import { settleFlags } from './settle-flags.ts'

/**
 * Credits a paid order to the seller it was meant for. The tallies of both follow in the same transaction; what
 * the customer paid and the ledger do not change.
 *
 * @throws AppError conflict when the order is not paid or is credited so already, invalid_input for a number
 *   that is not on the drive's roster.
 */
export function moveOrder(
  deps: Deps,
  move: { orderPublicId: string; sellerNumber: number; actor: string; reason: string; requestId: string },
): void {
  inTransaction(deps.db, tx => {
    const row = findOrder(tx, move.orderPublicId)
    if (!row) throw new AppError('not_found')
    if (row.status !== 'paid' && row.status !== 'partly_refunded')
      throw new AppError('conflict', { detail: refusal('onlyAPaidOrderCanBe') })
    const underWay = tx
      .select({ id: refund.id })
      .from(refund)
      .where(and(eq(refund.orderId, row.id), eq(refund.state, 'requested')))
      .get()
    if (underWay)
      throw new AppError('conflict', {
        detail: refusal('aRefundOfThisOrderIs'),
      })
    const to = tx
      .select({ id: seller.id, publicId: seller.publicId })
      .from(seller)
      .where(and(eq(seller.driveId, row.driveId), eq(seller.number, move.sellerNumber)))
      .get()
    if (!to)
      throw new AppError('invalid_input', {
        errors: [
          { path: 'sellerNumber', message: refusal('noSellerHasTheNumber', { number: move.sellerNumber }) },
        ],
      })
    const lines = listLines(tx, row.id).filter(line => line.sellerId !== to.id)
    if (lines.length === 0)
      throw new AppError('conflict', {
        detail: refusal('thisOrderIsCreditedToThat'),
      })
    for (const line of lines) {
      shiftTally(tx, row, line, { sellerId: line.sellerId, sign: -1 })
      shiftTally(tx, row, line, { sellerId: to.id, sign: 1 })
      tx.update(orderLine).set({ sellerId: to.id }).where(eq(orderLine.id, line.id)).run()
    }
    settleFlags(tx, { orderId: row.id, resolution: 'moved', actor: move.actor, now: deps.now() })
    logActivity(tx, {
      at: deps.now(),
      driveId: row.driveId,
      actor: move.actor,
      action: 'order_moved',
      subject: `order:${row.publicId}`,
      before: { sellers: [...new Set(lines.map(line => line.sellerId))] },
      after: { seller: to.publicId, number: move.sellerNumber },
      reason: move.reason,
      requestId: move.requestId,
    })
  })
}

/** Adds what is left of a line to a seller's tally, or takes it away. */
function shiftTally(tx: Tx, row: OrderRow, line: OrderLineRow, shift: { sellerId: number; sign: 1 | -1 }) {
  const quantity = line.quantity - line.refundedQuantity
  if (quantity === 0) return
  const change = {
    quantity: shift.sign * quantity,
    marks: shift.sign * quantity * line.tallyMarks,
    amountCents: shift.sign * quantity * line.unitPriceCents,
  }
  const { changes } = tx
    .update(sellerTally)
    .set({
      quantity: sql`${sellerTally.quantity} + ${change.quantity}`,
      marks: sql`${sellerTally.marks} + ${change.marks}`,
      amountCents: sql`${sellerTally.amountCents} + ${change.amountCents}`,
    })
    .where(
      and(
        eq(sellerTally.driveId, row.driveId),
        eq(sellerTally.sellerId, shift.sellerId),
        eq(sellerTally.code, line.code),
        eq(sellerTally.channel, 'online'),
        eq(sellerTally.state, 'credited'),
      ),
    )
    .run()
  if (changes === 1) return
  if (shift.sign < 0) throw new Error(`the tally of order ${row.id} is missing`)
  tx.insert(sellerTally)
    .values({
      driveId: row.driveId,
      sellerId: shift.sellerId,
      code: line.code,
      channel: 'online',
      state: 'credited',
      ...change,
    })
    .run()
}
