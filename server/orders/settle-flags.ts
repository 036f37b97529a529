import { and, eq, isNull } from 'drizzle-orm'
import { orderFlag } from '../db/schema/orders.ts'
import type { Tx } from '../db/transaction.ts'

/** Settles the open flags of an order in the transaction of what makes them moot; how many there were. */
export function settleFlags(
  tx: Tx,
  of: { orderId: number; resolution: 'known' | 'moved' | 'refunded'; actor: string | null; now: number },
): number {
  return tx
    .update(orderFlag)
    .set({ resolvedAt: of.now, resolvedBy: of.actor, resolution: of.resolution })
    .where(and(eq(orderFlag.orderId, of.orderId), isNull(orderFlag.resolvedAt)))
    .run().changes
}
