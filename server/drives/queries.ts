import { and, desc, eq, isNull, sql } from 'drizzle-orm'
import { drive, driveTerms, organization } from '../db/schema/drives.ts'
import { outbox } from '../db/schema/mail.ts'
import { order, orderFlag } from '../db/schema/orders.ts'
import { refund } from '../db/schema/payments.ts'
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

/** What of a drive waits for somebody: flags, letters that failed, refunds without an answer. */
export function countNeeds(tx: Tx, driveId: number) {
  const flags = tx
    .select({ n: sql<number>`count(*)` })
    .from(orderFlag)
    .innerJoin(order, eq(order.id, orderFlag.orderId))
    .where(and(eq(order.driveId, driveId), isNull(orderFlag.resolvedAt)))
    .get()
  const openRefunds = tx
    .select({ n: sql<number>`count(*)` })
    .from(refund)
    .innerJoin(order, eq(order.id, refund.orderId))
    .where(and(eq(order.driveId, driveId), eq(refund.state, 'requested')))
    .get()
  const failedLetters = tx
    .select({ n: sql<number>`count(*)` })
    .from(outbox)
    .innerJoin(order, sql`${outbox.subject} = 'order:' || ${order.publicId}`)
    .where(and(eq(outbox.state, 'failed'), eq(order.driveId, driveId)))
    .get()
  return { flags: flags?.n ?? 0, openRefunds: openRefunds?.n ?? 0, failedLetters: failedLetters?.n ?? 0 }
}
