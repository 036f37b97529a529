import { and, asc, desc, eq, isNull, or, type SQL, sql } from 'drizzle-orm'
import { isOrderNumber, normalOrderNumber } from '#shared/ids.ts'
import { drive, driveTerms, organization } from '../db/schema/drives.ts'
import { user } from '../db/schema/identity.ts'
import { outbox } from '../db/schema/mail.ts'
import { driveDay, order, orderCustomer, orderFlag } from '../db/schema/orders.ts'
import { paymentPutAside } from '../db/schema/payments.ts'
import { seller, sellerPerson } from '../db/schema/sellers.ts'
import type { Tx } from '../db/transaction.ts'

/** Which drives somebody of the operator sees: all, or, a rep, those they run. */
export type Reach = { repUserId: string | null }

const within = (reach: Reach): SQL | undefined =>
  reach.repUserId === null ? undefined : eq(drive.repUserId, reach.repUserId)

export function listDrives(tx: Tx, reach: Reach) {
  const ofDay = (column: SQL) =>
    sql<number>`coalesce((select sum(${column}) from ${driveDay} where ${driveDay.driveId} = ${drive.id}), 0)`
  return tx
    .select({
      drive,
      organization: organization.name,
      rep: user.name,
      deliveryFrom: driveTerms.deliveryFrom,
      deliveryTo: driveTerms.deliveryTo,
      orders: ofDay(sql`${driveDay.orders}`),
      items: ofDay(sql`${driveDay.items}`),
      itemsCents: ofDay(sql`${driveDay.itemsCents}`),
      flags: sql<number>`(select count(*) from ${orderFlag} join ${order} on ${order.id} = ${orderFlag.orderId} where ${order.driveId} = ${drive.id} and ${orderFlag.resolvedAt} is null)`,
    })
    .from(drive)
    .innerJoin(organization, eq(organization.id, drive.organizationId))
    .innerJoin(
      driveTerms,
      and(
        eq(driveTerms.driveId, drive.id),
        eq(driveTerms.version, sql`(select max(version) from drive_terms where drive_id = ${drive.id})`),
      ),
    )
    .leftJoin(user, eq(user.id, drive.repUserId))
    .where(within(reach))
    .orderBy(asc(drive.closesAt))
    .all()
}

/** Payments that wait for a decision. One that belongs to no order is seen by those who see everything. */
export function listPutAside(tx: Tx, reach: Reach) {
  return tx
    .select({
      aside: paymentPutAside,
      orderNumber: order.number,
      orderPublicId: order.publicId,
      drivePublicId: drive.publicId,
      organization: organization.name,
    })
    .from(paymentPutAside)
    .leftJoin(order, eq(order.id, paymentPutAside.orderId))
    .leftJoin(drive, eq(drive.id, order.driveId))
    .leftJoin(organization, eq(organization.id, drive.organizationId))
    .where(and(isNull(paymentPutAside.resolvedAt), within(reach)))
    .orderBy(asc(paymentPutAside.createdAt))
    .limit(200)
    .all()
}

/** Letters that will not be tried again by themselves. */
export function listFailedLetters(tx: Tx, reach: Reach) {
  return tx
    .select({ letter: outbox })
    .from(outbox)
    .leftJoin(order, sql`${outbox.subject} = 'order:' || ${order.publicId}`)
    .leftJoin(drive, eq(drive.id, order.driveId))
    .where(and(eq(outbox.state, 'failed'), within(reach)))
    .orderBy(desc(outbox.createdAt))
    .limit(200)
    .all()
    .map(row => row.letter)
}

const FOUND = 25

export function searchOrders(tx: Tx, reach: Reach, text: string) {
  const like = toLike(text)
  const byText = isOrderNumber(text)
    ? eq(order.number, normalOrderNumber(text))
    : or(
        sql`${orderCustomer.name} like ${like} escape '\\'`,
        sql`${orderCustomer.email} like ${like} escape '\\'`,
      )
  return tx
    .select({
      driveId: drive.publicId,
      orderId: order.publicId,
      number: order.number,
      customer: orderCustomer.name,
      organization: organization.name,
      status: order.status,
    })
    .from(order)
    .innerJoin(orderCustomer, eq(orderCustomer.orderId, order.id))
    .innerJoin(drive, eq(drive.id, order.driveId))
    .innerJoin(organization, eq(organization.id, drive.organizationId))
    .where(and(within(reach), byText))
    .orderBy(desc(order.placedAt))
    .limit(FOUND)
    .all()
}

export function searchSellers(tx: Tx, reach: Reach, text: string) {
  const like = toLike(text)
  return tx
    .select({
      driveId: drive.publicId,
      firstName: sellerPerson.firstName,
      lastName: sellerPerson.lastName,
      number: seller.number,
      organization: organization.name,
    })
    .from(sellerPerson)
    .innerJoin(seller, eq(seller.id, sellerPerson.sellerId))
    .innerJoin(drive, eq(drive.id, seller.driveId))
    .innerJoin(organization, eq(organization.id, drive.organizationId))
    .where(
      and(
        within(reach),
        or(
          sql`${sellerPerson.firstName} || ' ' || ${sellerPerson.lastName} like ${like} escape '\\'`,
          sql`${organization.name} like ${like} escape '\\'`,
        ),
      ),
    )
    .limit(FOUND)
    .all()
}

export function findPutAside(tx: Tx, publicId: string) {
  return tx.select().from(paymentPutAside).where(eq(paymentPutAside.publicId, publicId)).get() ?? null
}

function toLike(text: string): string {
  return `%${text.replaceAll(/[\\%_]/g, found => `\\${found}`)}%`
}
