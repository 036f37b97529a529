import { and, eq } from 'drizzle-orm'
import { logActivity } from '../activity/log-activity.ts'
import { order } from '../db/schema/orders.ts'
import type { Tx } from '../db/transaction.ts'
import type { OrderRow } from './queries.ts'

/** Ends an order that can no longer be paid. Only on the payment service's word; a paid order stays paid. */
export function expireOrder(tx: Tx, row: OrderRow, now: number): 'expired' | 'waiting' {
  const { changes } = tx
    .update(order)
    .set({ status: 'expired', endedAt: now })
    .where(and(eq(order.id, row.id), eq(order.status, 'awaiting_payment')))
    .run()
  if (changes !== 1) return 'waiting'
  logActivity(tx, {
    at: now,
    driveId: row.driveId,
    actor: 'payment_service',
    action: 'order_expired',
    subject: `order:${row.publicId}`,
    before: { status: row.status },
    after: { status: 'expired' },
  })
  return 'expired'
}
