import { and, asc, eq, inArray, lt, sql } from 'drizzle-orm'
import { prepared } from '../db/prepared.ts'
import { drive, driveTerms, organization } from '../db/schema/drives.ts'
import { order, orderCustomer, orderLine, orderRecipient } from '../db/schema/orders.ts'
import { paymentSession } from '../db/schema/payments.ts'
import { seller, sellerGroup, sellerPerson, storeLink } from '../db/schema/sellers.ts'
import type { Tx } from '../db/transaction.ts'

export type OrderRow = typeof order.$inferSelect
export type OrderLineRow = typeof orderLine.$inferSelect

const byKey = prepared(orm =>
  orm
    .select()
    .from(order)
    .where(and(eq(order.linkId, sql.placeholder('linkId')), eq(order.idempotencyKey, sql.placeholder('key'))))
    .prepare(),
)
const byPublicId = prepared(orm =>
  orm
    .select()
    .from(order)
    .where(eq(order.publicId, sql.placeholder('publicId')))
    .prepare(),
)
const linesOf = prepared(orm =>
  orm
    .select()
    .from(orderLine)
    .where(eq(orderLine.orderId, sql.placeholder('orderId')))
    .orderBy(asc(orderLine.position))
    .prepare(),
)
const customerOf = prepared(orm =>
  orm
    .select()
    .from(orderCustomer)
    .where(eq(orderCustomer.orderId, sql.placeholder('orderId')))
    .prepare(),
)
const sessionOf = prepared(orm =>
  orm
    .select()
    .from(paymentSession)
    .where(eq(paymentSession.orderId, sql.placeholder('orderId')))
    .prepare(),
)

export function findOrderByKey(tx: Tx, linkId: number, key: string): OrderRow | null {
  return byKey(tx).get({ linkId, key }) ?? null
}

export function findOrder(tx: Tx, publicId: string): OrderRow | null {
  return byPublicId(tx).get({ publicId }) ?? null
}

export function listLines(tx: Tx, orderId: number): OrderLineRow[] {
  return linesOf(tx).all({ orderId })
}

export function findCustomer(tx: Tx, orderId: number) {
  return customerOf(tx).get({ orderId }) ?? null
}

export function findSession(tx: Tx, orderId: number) {
  return sessionOf(tx).get({ orderId }) ?? null
}

/** Orders placed before `before` that no payment and no expiry has settled yet, oldest first. */
export function listWaiting(tx: Tx, options: { before: number; limit: number }) {
  return tx
    .select({
      id: order.id,
      publicId: order.publicId,
      placedAt: order.placedAt,
      sessionId: paymentSession.sessionId,
      replacedById: order.replacedById,
    })
    .from(order)
    .leftJoin(paymentSession, eq(paymentSession.orderId, order.id))
    .where(and(eq(order.status, 'awaiting_payment'), lt(order.placedAt, options.before)))
    .orderBy(asc(order.placedAt))
    .limit(options.limit)
    .all()
}

/** Everything around an order that its receipt tells, in one read. */
export function findOrderSetting(tx: Tx, orderId: number) {
  const found = tx
    .select({
      organizationName: organization.name,
      timeZone: drive.timeZone,
      closesAt: drive.closesAt,
      closedEarlyAt: drive.closedEarlyAt,
      contactName: drive.contactName,
      contactEmail: drive.contactEmail,
      deliveryFrom: driveTerms.deliveryFrom,
      deliveryTo: driveTerms.deliveryTo,
      shareBp: driveTerms.shareBp,
      prizeEvery: driveTerms.prizeEvery,
      organizationBearsCardFees: driveTerms.organizationBearsCardFees,
      sellerKind: seller.kind,
      linkToken: storeLink.token,
      linkState: storeLink.state,
    })
    .from(order)
    .innerJoin(drive, eq(drive.id, order.driveId))
    .innerJoin(organization, eq(organization.id, drive.organizationId))
    .innerJoin(driveTerms, eq(driveTerms.id, order.termsId))
    .innerJoin(storeLink, eq(storeLink.id, order.linkId))
    .innerJoin(seller, eq(seller.id, storeLink.sellerId))
    .where(eq(order.id, orderId))
    .get()
  if (!found) throw new Error(`order ${orderId} has lost its drive`)
  return found
}

/** Names, inside and public, of sellers that lines credit. */
export function listCreditedSellers(tx: Tx, sellerIds: number[]) {
  if (sellerIds.length === 0) return []
  return tx
    .select({
      sellerId: seller.id,
      sellerPublicId: seller.publicId,
      sellerKind: seller.kind,
      number: seller.number,
      firstName: sellerPerson.firstName,
      lastName: sellerPerson.lastName,
      nameShownSince: sellerPerson.nameShownSince,
      groupName: sellerGroup.name,
    })
    .from(seller)
    .leftJoin(sellerPerson, eq(sellerPerson.sellerId, seller.id))
    .leftJoin(sellerGroup, eq(sellerGroup.id, seller.groupId))
    .where(inArray(seller.id, sellerIds))
    .all()
}

export function listRecipients(tx: Tx, orderId: number) {
  return tx.select().from(orderRecipient).where(eq(orderRecipient.orderId, orderId)).all()
}
