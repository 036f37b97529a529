import { and, eq, inArray } from 'drizzle-orm'
import { AppError } from '#shared/errors.ts'
import { refusal } from '#shared/messages/refusals.ts'
import { logActivity } from '../activity/log-activity.ts'
import { order, orderFlag, orderLine } from '../db/schema/orders.ts'
import { inTransaction } from '../db/transaction.ts'
import type { Deps } from '../deps.ts'
import { newPublicId } from '../ids.ts'
import { queueLetter } from '../mail/queue-letter.ts'
import { settleFlags } from '../orders/settle-flags.ts'
import { listMembers } from '../people/queries.ts'

/**
 * A family does not know who ordered. The drive's leads are told and decide; a second flag of the same order by
 * the same family changes nothing.
 *
 * @throws AppError not_found when the order has no line of this seller, or is not paid.
 */
export function flagOrder(
  deps: Deps,
  of: {
    sellerId: number
    driveId: number
    orderPublicId: string
    note: string
    actor: string
    requestId: string
  },
): void {
  inTransaction(deps.db, tx => {
    const now = deps.now()
    const found = tx
      .select({ id: order.id, publicId: order.publicId, number: order.number })
      .from(order)
      .innerJoin(orderLine, eq(orderLine.orderId, order.id))
      .where(
        and(
          eq(order.publicId, of.orderPublicId),
          eq(orderLine.sellerId, of.sellerId),
          inArray(order.status, ['paid', 'partly_refunded']),
        ),
      )
      .get()
    if (!found) throw new AppError('not_found')
    const { changes } = tx
      .insert(orderFlag)
      .values({
        publicId: newPublicId(),
        orderId: found.id,
        sellerId: of.sellerId,
        raisedBy: of.actor,
        note: of.note,
        raisedAt: now,
      })
      .onConflictDoNothing()
      .run()
    if (changes !== 1) return
    logActivity(tx, {
      at: now,
      driveId: of.driveId,
      actor: of.actor,
      action: 'order_flagged',
      subject: `order:${found.publicId}`,
      requestId: of.requestId,
    })
    for (const lead of listMembers(tx, of.driveId, 'lead'))
      queueLetter(tx, {
        kind: 'staff_notice',
        subject: `flag:${found.publicId}`,
        to: { name: lead.name, email: lead.email },
        locale: 'en',
        facts: {
          notice: 'order_flagged',
          number: found.number,
          drivePublicId: lead.drivePublicId,
          orderPublicId: found.publicId,
        },
        at: now,
      })
  })
}

/** Settles the open flags of an order: the person is known after all, or what else was done. */
export function resolveFlags(
  deps: Deps,
  of: {
    orderId: number
    resolution: 'known' | 'moved' | 'refunded'
    actor: string
    reason: string
    requestId: string
  },
): void {
  inTransaction(deps.db, tx => {
    const row = tx.select().from(order).where(eq(order.id, of.orderId)).get()!
    if (settleFlags(tx, { ...of, now: deps.now() }) === 0)
      throw new AppError('conflict', { detail: refusal('noFlagIsOpenOnThis') })
    logActivity(tx, {
      at: deps.now(),
      driveId: row.driveId,
      actor: of.actor,
      action: 'flag_resolved',
      subject: `order:${row.publicId}`,
      after: { resolution: of.resolution },
      reason: of.reason,
      requestId: of.requestId,
    })
  })
}
