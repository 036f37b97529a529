import { and, desc, eq, inArray, isNull, ne } from 'drizzle-orm'
import { drive, driveTerms, organization } from '../db/schema/drives.ts'
import { order, orderCustomer, orderFlag, orderLine } from '../db/schema/orders.ts'
import { seller, sellerGroup, sellerPerson } from '../db/schema/sellers.ts'
import type { Tx } from '../db/transaction.ts'

/** A student with their drive, for those who may see it. */
export function getSeller(tx: Tx, sellerId: number) {
  const found = tx
    .select({
      publicId: seller.publicId,
      number: seller.number,
      kind: seller.kind,
      firstName: sellerPerson.firstName,
      lastName: sellerPerson.lastName,
      nameShownSince: sellerPerson.nameShownSince,
      group: sellerGroup.name,
      organization: organization.name,
      driveName: drive.name,
      opensAt: drive.opensAt,
      closesAt: drive.closesAt,
      closedEarlyAt: drive.closedEarlyAt,
      launchedAt: drive.launchedAt,
      timeZone: drive.timeZone,
      deliveryFrom: driveTerms.deliveryFrom,
      deliveryTo: driveTerms.deliveryTo,
      prizeEvery: driveTerms.prizeEvery,
    })
    .from(seller)
    .innerJoin(sellerPerson, eq(sellerPerson.sellerId, seller.id))
    .innerJoin(sellerGroup, eq(sellerGroup.id, seller.groupId))
    .innerJoin(drive, eq(drive.id, seller.driveId))
    .innerJoin(driveTerms, eq(driveTerms.driveId, drive.id))
    .innerJoin(organization, eq(organization.id, drive.organizationId))
    .where(eq(seller.id, sellerId))
    .orderBy(desc(driveTerms.version))
    .limit(1)
    .get()
  if (!found) throw new Error(`seller ${sellerId} has lost their drive`)
  return found
}

/** The newest credited orders of a seller, with only this seller's lines. Waiting and expired ones are left out. */
export function listCreditedOrders(tx: Tx, sellerId: number, limit: number) {
  const rows = tx
    .selectDistinct({
      id: order.id,
      publicId: order.publicId,
      number: order.number,
      status: order.status,
      placedAt: order.placedAt,
      customerName: orderCustomer.name,
      relationship: orderCustomer.relationship,
    })
    .from(orderLine)
    .innerJoin(order, eq(order.id, orderLine.orderId))
    .innerJoin(orderCustomer, eq(orderCustomer.orderId, order.id))
    .where(
      and(eq(orderLine.sellerId, sellerId), inArray(order.status, ['paid', 'partly_refunded', 'refunded'])),
    )
    .orderBy(desc(order.placedAt))
    .limit(limit)
    .all()
  if (rows.length === 0) return []
  const lines = tx
    .select({
      orderId: orderLine.orderId,
      code: orderLine.code,
      name: orderLine.name,
      quantity: orderLine.quantity,
      refundedQuantity: orderLine.refundedQuantity,
    })
    .from(orderLine)
    .where(
      and(
        inArray(
          orderLine.orderId,
          rows.map(row => row.id),
        ),
        eq(orderLine.sellerId, sellerId),
      ),
    )
    .orderBy(orderLine.orderId, orderLine.position)
    .all()
  return rows.map(row => ({ ...row, lines: lines.filter(line => line.orderId === row.id) }))
}

/** The students of a drive in order of their numbers. */
export function listStudents(tx: Tx, driveId: number) {
  return tx
    .select({
      sellerId: seller.id,
      publicId: seller.publicId,
      number: seller.number,
      firstName: sellerPerson.firstName,
      lastName: sellerPerson.lastName,
      group: sellerGroup.name,
      groupPosition: sellerGroup.position,
    })
    .from(seller)
    .innerJoin(sellerPerson, eq(sellerPerson.sellerId, seller.id))
    .innerJoin(sellerGroup, eq(sellerGroup.id, seller.groupId))
    .where(and(eq(seller.driveId, driveId), eq(seller.kind, 'student')))
    .orderBy(seller.number)
    .all()
}

/** Those that stand for a group or the whole organization, credited by people who know no seller. */
export function listHouseSellers(tx: Tx, driveId: number) {
  return tx
    .select({ sellerId: seller.id, kind: seller.kind, group: sellerGroup.name })
    .from(seller)
    .leftJoin(sellerGroup, eq(sellerGroup.id, seller.groupId))
    .where(and(eq(seller.driveId, driveId), ne(seller.kind, 'student')))
    .all()
}

export function listGroups(tx: Tx, driveId: number) {
  return tx
    .select({ id: sellerGroup.id, publicId: sellerGroup.publicId, name: sellerGroup.name })
    .from(sellerGroup)
    .where(eq(sellerGroup.driveId, driveId))
    .orderBy(sellerGroup.position)
    .all()
}

/** Internal ids of orders that this seller's family flagged and nobody has settled. */
export function listFlaggedOrders(tx: Tx, sellerId: number): Set<number> {
  return new Set(
    tx
      .select({ orderId: orderFlag.orderId })
      .from(orderFlag)
      .where(and(eq(orderFlag.sellerId, sellerId), isNull(orderFlag.resolvedAt)))
      .all()
      .map(row => row.orderId),
  )
}
