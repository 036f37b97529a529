import { eq, sql } from 'drizzle-orm'
import { driveDay, sellerTally } from '../db/schema/orders.ts'
import type { Tx } from '../db/transaction.ts'

/** Tally marks of a seller, online and paper, verified and provisional together. */
export function sellerMarks(tx: Tx, sellerId: number): number {
  const row = tx
    .select({ marks: sql<number>`coalesce(sum(${sellerTally.marks}), 0)` })
    .from(sellerTally)
    .where(eq(sellerTally.sellerId, sellerId))
    .get()
  return row?.marks ?? 0
}

export function sellerTotals(tx: Tx, sellerId: number) {
  const row = tx
    .select({
      items: sql<number>`coalesce(sum(${sellerTally.quantity}), 0)`,
      marks: sql<number>`coalesce(sum(${sellerTally.marks}), 0)`,
      amountCents: sql<number>`coalesce(sum(${sellerTally.amountCents}), 0)`,
    })
    .from(sellerTally)
    .where(eq(sellerTally.sellerId, sellerId))
    .get()
  return row ?? { items: 0, marks: 0, amountCents: 0 }
}

/** Items and money by seller of a drive, from the kept roll-up. */
export function totalsBySeller(tx: Tx, driveId: number) {
  return tx
    .select({
      sellerId: sellerTally.sellerId,
      items: sql<number>`sum(${sellerTally.quantity})`,
      amountCents: sql<number>`sum(${sellerTally.amountCents})`,
    })
    .from(sellerTally)
    .where(eq(sellerTally.driveId, driveId))
    .groupBy(sellerTally.sellerId)
    .all()
}

export function listDays(tx: Tx, driveId: number) {
  return tx.select().from(driveDay).where(eq(driveDay.driveId, driveId)).orderBy(driveDay.day).all()
}
