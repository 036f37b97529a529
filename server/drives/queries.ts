import { and, desc, eq, sql } from 'drizzle-orm'
import { drive, driveTerms, organization } from '../db/schema/drives.ts'
import { order } from '../db/schema/orders.ts'
import type { Tx } from '../db/transaction.ts'

export function getDrive(tx: Tx, driveId: number) {
  const found = tx
    .select({
      drive,
      organizationName: organization.name,
      deliveryFrom: driveTerms.deliveryFrom,
      deliveryTo: driveTerms.deliveryTo,
      prizeEvery: driveTerms.prizeEvery,
    })
    .from(drive)
    .innerJoin(organization, eq(organization.id, drive.organizationId))
    .innerJoin(driveTerms, eq(driveTerms.driveId, drive.id))
    .where(eq(drive.id, driveId))
    .orderBy(desc(driveTerms.version))
    .limit(1)
    .get()
  if (!found) throw new Error(`drive ${driveId} is gone`)
  return found
}

/** How many orders of the drive still wait for their payment. */
export function countWaiting(tx: Tx, driveId: number): number {
  const row = tx
    .select({ n: sql<number>`count(*)` })
    .from(order)
    .where(and(eq(order.driveId, driveId), eq(order.status, 'awaiting_payment')))
    .get()
  return row?.n ?? 0
}
