import { and, eq, sql } from 'drizzle-orm'
import { localDay } from '#shared/deadline/wall-time.ts'
import { AppError } from '#shared/errors.ts'
import { type RefundableOrder, refundAmount } from '#shared/fees/refund.ts'
import { refusal } from '#shared/messages/refusals.ts'
import { logActivity } from '../activity/log-activity.ts'
import { PaymentServiceError } from '../clients/payments.ts'
import { driveDay, order, orderLine, sellerTally } from '../db/schema/orders.ts'
import { refund, refundLine } from '../db/schema/payments.ts'
import { inTransaction, type Tx } from '../db/transaction.ts'
import type { Deps } from '../deps.ts'
import { hit } from '../faults.ts'
import { newPublicId } from '../ids.ts'
import { postJournal } from '../ledger/post-journal.ts'
import { queueLetter } from '../mail/queue-letter.ts'
import { listStaff } from '../people/queries.ts'
import {
  findCustomer,
  findOrder,
  findOrderSetting,
  findSession,
  listLines,
  type OrderLineRow,
  type OrderRow,
} from './queries.ts'
import { listOpenRefunds, listRefundLines, type RefundRow } from './refund-queries.ts'
import { settleFlags } from './settle-flags.ts'

export type RefundRequest = {
  orderPublicId: string
  /** The whole of what is left, or so many of certain lines. */
  what: 'everything' | { lineId: number; quantity: number }[]
  reason: string
  /** The user who decided, or null for the product itself. */
  actor: string | null
  requestId?: string | undefined
}

/**
 * Gives money back: decides and reserves the amounts, asks the payment service, then lets status, tally,
 * roll-ups, ledger and the customer's letter follow. Every step may be repeated; the reservation under the
 * lock is what keeps ten simultaneous requests from refunding twice.
 *
 * @throws AppError not_found, conflict (nothing left, not paid, another refund under way), invalid_input.
 */
export async function refundOrder(deps: Deps, request: RefundRequest): Promise<RefundRow> {
  const row = inTransaction(deps.db, tx => reserveRefund(deps, tx, request))
  hit('F21')
  return finishRefund(deps, row)
}

/** Decides a refund and takes its amounts out of what is left, in one transaction. */
export function reserveRefund(deps: Deps, tx: Tx, request: RefundRequest): RefundRow {
  const now = deps.now()
  const found = findOrder(tx, request.orderPublicId)
  if (!found) throw new AppError('not_found')
  if (found.status !== 'paid' && found.status !== 'partly_refunded')
    throw new AppError('conflict', { detail: refusal('thisOrderHasNothingLeftTo') })
  const lines = listLines(tx, found.id)
  const open = tx
    .select({ id: refund.id })
    .from(refund)
    .where(and(eq(refund.orderId, found.id), eq(refund.state, 'requested')))
    .get()
  if (open)
    throw new AppError('conflict', {
      detail: refusal('anotherRefundOfThisOrderIs'),
    })
  const wanted =
    request.what === 'everything'
      ? lines.map(line => ({ lineId: line.id, quantity: line.quantity - line.refundedQuantity }))
      : request.what
  const decided = refundAmount({
    order: toRefundable(found, lines),
    wanted: wanted.filter(line => line.quantity > 0),
    everything: request.what === 'everything',
  })
  if (!decided.ok) throw new AppError('conflict', { detail: refusal('thatIsMoreThanWhatIs') })

  for (const line of decided.lines) {
    const { changes } = tx
      .update(orderLine)
      .set({
        refundedQuantity: sql`${orderLine.refundedQuantity} + ${line.quantity}`,
        refundedCents: sql`${orderLine.refundedCents} + ${line.amountCents + line.taxCents}`,
      })
      .where(
        and(
          eq(orderLine.id, line.id),
          eq(orderLine.orderId, found.id),
          sql`${orderLine.refundedQuantity} + ${line.quantity} <= ${orderLine.quantity}`,
        ),
      )
      .run()
    if (changes !== 1) throw new AppError('conflict', { detail: refusal('thatIsMoreThanWhatIs') })
  }
  const { changes } = tx
    .update(order)
    .set({ refundedCents: sql`${order.refundedCents} + ${decided.amountCents}` })
    .where(
      and(
        eq(order.id, found.id),
        sql`${order.refundedCents} + ${decided.amountCents} <= ${order.totalCents}`,
      ),
    )
    .run()
  if (changes !== 1) throw new AppError('conflict', { detail: refusal('thatIsMoreThanWhatIs') })

  const row = tx
    .insert(refund)
    .values({
      publicId: newPublicId(),
      orderId: found.id,
      state: 'requested',
      amountCents: decided.amountCents,
      giftCents: decided.giftCents,
      coverCents: decided.coverCents,
      reason: request.reason,
      requestedBy: request.actor,
      requestedAt: now,
    })
    .returning()
    .get()
  for (const line of decided.lines)
    tx.insert(refundLine)
      .values({
        refundId: row.id,
        orderLineId: line.id,
        quantity: line.quantity,
        amountCents: line.amountCents,
        taxCents: line.taxCents,
      })
      .run()
  logActivity(tx, {
    at: now,
    driveId: found.driveId,
    actor: request.actor ?? 'system',
    action: 'refund_requested',
    subject: `order:${found.publicId}`,
    after: { refund: row.publicId, amountCents: row.amountCents },
    reason: request.reason,
    requestId: request.requestId,
  })
  return row
}

/** What the refund rules need to know of an order. */
export function toRefundable(row: OrderRow, lines: readonly OrderLineRow[]): RefundableOrder {
  return {
    lines: lines.map(line => ({
      id: line.id,
      quantity: line.quantity,
      unitPriceCents: line.unitPriceCents,
      taxCents: line.taxCents,
      refundedQuantity: line.refundedQuantity,
      refundedCents: line.refundedCents,
    })),
    giftCents: row.giftCents,
    coverCents: row.coverCents,
    totalCents: row.totalCents,
    refundedCents: row.refundedCents,
  }
}

/** Asks the payment service for a reserved refund, with the refund's own key, and notes what it says. */
export async function finishRefund(deps: Deps, row: RefundRow): Promise<RefundRow> {
  const session = findSession(deps.db.orm, row.orderId)
  if (!session?.paymentIntentId) throw new Error(`order ${row.orderId} is paid without a payment`)
  let answer: { providerRefundId: string; status: string }
  try {
    answer = await deps.payments.refund({
      refundPublicId: row.publicId,
      paymentIntentId: session.paymentIntentId,
      amountCents: row.amountCents,
    })
  } catch (error) {
    if (!(error instanceof PaymentServiceError)) throw error
    if (error.kind === 'refused' && error.code !== 'idempotency_key_in_use')
      return settleRefund(deps, row, null, 'failed')
    deps.log.warn({ refund: row.id, kind: error.kind }, 'refund not confirmed yet')
    return row
  }
  hit('F22')
  return settleRefund(deps, row, answer.providerRefundId, answer.status)
}

/** Lets everything follow a refund that went through, or gives the reservation back when it failed. */
export function settleRefund(
  deps: Deps,
  row: RefundRow,
  providerRefundId: string | null,
  status: string,
): RefundRow {
  if (status === 'failed' || status === 'canceled')
    return inTransaction(deps.db, tx => undoRefund(deps, tx, row))
  return inTransaction(deps.db, tx => applyRefund(deps, tx, row, providerRefundId))
}

export function applyRefund(deps: Deps, tx: Tx, row: RefundRow, providerRefundId: string | null): RefundRow {
  const now = deps.now()
  const { changes } = tx
    .update(refund)
    .set({ state: 'succeeded', providerRefundId, finishedAt: now })
    .where(and(eq(refund.id, row.id), eq(refund.state, 'requested')))
    .run()
  const current = tx.select().from(refund).where(eq(refund.id, row.id)).get()!
  if (changes !== 1) return current
  const found = tx.select().from(order).where(eq(order.id, row.orderId)).get()!
  const lines = listRefundLines(tx, row.id)
  const taxCents = lines.reduce((sum, line) => sum + line.taxCents, 0)
  const itemsCents = lines.reduce((sum, line) => sum + line.amountCents, 0)

  for (const line of lines)
    tx.update(sellerTally)
      .set({
        quantity: sql`${sellerTally.quantity} - ${line.quantity}`,
        marks: sql`${sellerTally.marks} - ${line.quantity * line.tallyMarks}`,
        amountCents: sql`${sellerTally.amountCents} - ${line.amountCents}`,
      })
      .where(
        and(
          eq(sellerTally.driveId, found.driveId),
          eq(sellerTally.sellerId, line.sellerId),
          eq(sellerTally.code, line.code),
          eq(sellerTally.channel, 'online'),
          eq(sellerTally.state, 'credited'),
        ),
      )
      .run()
  const { timeZone } = findOrderSetting(tx, found.id)
  tx.update(driveDay)
    .set({
      items: sql`${driveDay.items} - ${lines.reduce((sum, line) => sum + line.quantity, 0)}`,
      itemsCents: sql`${driveDay.itemsCents} - ${itemsCents}`,
      giftCents: sql`${driveDay.giftCents} - ${row.giftCents}`,
      refundedCents: sql`${driveDay.refundedCents} + ${row.amountCents}`,
    })
    .where(and(eq(driveDay.driveId, found.driveId), eq(driveDay.day, localDay(found.placedAt, timeZone))))
    .run()
  postJournal(tx, {
    driveId: found.driveId,
    kind: 'refund',
    subject: row.publicId,
    at: now,
    entries: [
      { debit: 'refunds', credit: 'cash_operator', amountCents: itemsCents },
      { debit: 'gifts', credit: 'cash_operator', amountCents: row.giftCents },
      { debit: 'tax', credit: 'cash_operator', amountCents: taxCents },
      { debit: 'cover', credit: 'cash_operator', amountCents: row.coverCents },
    ],
  })
  const status = found.refundedCents === found.totalCents ? 'refunded' : 'partly_refunded'
  tx.update(order).set({ status }).where(eq(order.id, found.id)).run()
  if (status === 'refunded')
    settleFlags(tx, { orderId: found.id, resolution: 'refunded', actor: row.requestedBy, now })
  logActivity(tx, {
    at: now,
    driveId: found.driveId,
    actor: row.requestedBy ?? 'system',
    action: 'refunded',
    subject: `order:${found.publicId}`,
    before: { status: found.status },
    after: { status, refund: row.publicId, amountCents: row.amountCents },
    reason: row.reason,
  })
  tellCustomer(tx, found, row, now)
  return current
}

function tellCustomer(tx: Tx, found: OrderRow, row: RefundRow, now: number) {
  const customer = findCustomer(tx, found.id)
  if (!customer) return
  queueLetter(tx, {
    kind: 'refund_notice',
    subject: `refund:${row.publicId}`,
    to: { name: customer.name, email: customer.email },
    locale: found.locale as 'en' | 'es',
    facts: { refundPublicId: row.publicId },
    at: now,
  })
}

/** The service refused: what was reserved is left for another try, and staff hears of it. */
function undoRefund(deps: Deps, tx: Tx, row: RefundRow): RefundRow {
  const now = deps.now()
  const { changes } = tx
    .update(refund)
    .set({ state: 'failed', finishedAt: now })
    .where(and(eq(refund.id, row.id), eq(refund.state, 'requested')))
    .run()
  const current = tx.select().from(refund).where(eq(refund.id, row.id)).get()!
  if (changes !== 1) return current
  for (const line of listRefundLines(tx, row.id))
    tx.update(orderLine)
      .set({
        refundedQuantity: sql`${orderLine.refundedQuantity} - ${line.quantity}`,
        refundedCents: sql`${orderLine.refundedCents} - ${line.amountCents + line.taxCents}`,
      })
      .where(eq(orderLine.id, line.orderLineId))
      .run()
  const found = tx
    .update(order)
    .set({ refundedCents: sql`${order.refundedCents} - ${row.amountCents}` })
    .where(eq(order.id, row.orderId))
    .returning()
    .get()
  logActivity(tx, {
    at: now,
    driveId: found.driveId,
    actor: 'payment_service',
    action: 'refund_failed',
    subject: `order:${found.publicId}`,
    after: { refund: row.publicId, amountCents: row.amountCents },
  })
  for (const admin of listStaff(tx, 'admin'))
    queueLetter(tx, {
      kind: 'staff_notice',
      subject: `refund:${row.publicId}`,
      to: { name: admin.name, email: admin.email },
      locale: 'en',
      facts: {
        notice: 'refund_failed',
        amountCents: row.amountCents,
        currency: found.currency,
        number: found.number,
      },
      at: now,
    })
  return current
}

/** After a crash or a silent payment service: asks again about every refund that was decided. */
export async function finishOpenRefunds(deps: Deps) {
  for (const row of listOpenRefunds(deps.db.orm)) await finishRefund(deps, row)
}
