import { and, asc, desc, eq, exists, inArray, isNull, or, type SQL, sql } from 'drizzle-orm'
import type { OrderRowView, OrdersQuery, OrdersView } from '#shared/drives/orders-contract.ts'
import { isOrderNumber, normalOrderNumber } from '#shared/ids.ts'
import { order, orderCustomer, orderFlag, orderLine } from '../db/schema/orders.ts'
import { seller, sellerGroup, sellerPerson } from '../db/schema/sellers.ts'
import type { Tx } from '../db/transaction.ts'
import type { Deps } from '../deps.ts'
import { listGroups } from '../sellers/queries.ts'
import { getDrive } from './queries.ts'

export const PAGE_SIZE = 50

/** One page of the drive's orders; searching, sorting and paging are done here, never in the browser. */
export function listOrders(deps: Deps, driveId: number, query: OrdersQuery): OrdersView {
  const { orm } = deps.db
  const where = toWhere(orm, driveId, query)
  const total =
    orm
      .select({ n: sql<number>`count(*)` })
      .from(order)
      .innerJoin(orderCustomer, eq(orderCustomer.orderId, order.id))
      .where(where)
      .get()?.n ?? 0
  const pages = Math.max(1, Math.ceil(total / PAGE_SIZE))
  const page = Math.min(pages, Math.max(1, Number(query.page ?? '1')))
  return {
    rows: readRows(orm, where, query, { limit: PAGE_SIZE, offset: (page - 1) * PAGE_SIZE }),
    total,
    page,
    pages,
    timeZone: getDrive(orm, driveId).drive.timeZone,
    groups: listGroups(orm, driveId).map(group => group.name),
  }
}

/** The same selection for an export, a bounded batch at a time. */
export function* eachOrder(deps: Deps, driveId: number, query: OrdersQuery): Generator<OrderRowView> {
  const where = toWhere(deps.db.orm, driveId, query)
  for (let offset = 0; ; offset += 500) {
    const rows = readRows(deps.db.orm, where, query, { limit: 500, offset })
    yield* rows
    if (rows.length < 500) return
  }
}

function readRows(
  tx: Tx,
  where: SQL,
  query: OrdersQuery,
  bounds: { limit: number; offset: number },
): OrderRowView[] {
  const firstSeller = sql<number>`(select seller_id from order_line where order_line.order_id = ${order.id} order by position limit 1)`
  const sorts = {
    placed: order.placedAt,
    total: order.totalCents,
    customer: sql`lower(${orderCustomer.name})`,
    seller: seller.number,
    number: order.number,
  }
  const direction = query.direction === 'up' ? asc : desc
  const rows = tx
    .select({
      orderId: order.id,
      id: order.publicId,
      number: order.number,
      status: order.status,
      placedAt: order.placedAt,
      customerName: orderCustomer.name,
      relationship: orderCustomer.relationship,
      itemCount: order.itemCount,
      totalCents: order.totalCents,
      refundedCents: order.refundedCents,
      sellerNumber: seller.number,
      firstName: sellerPerson.firstName,
      lastName: sellerPerson.lastName,
      group: sellerGroup.name,
    })
    .from(order)
    .innerJoin(orderCustomer, eq(orderCustomer.orderId, order.id))
    .leftJoin(seller, eq(seller.id, firstSeller))
    .leftJoin(sellerPerson, eq(sellerPerson.sellerId, seller.id))
    .leftJoin(sellerGroup, eq(sellerGroup.id, seller.groupId))
    .where(where)
    .orderBy(direction(sorts[query.sort ?? 'placed']), desc(order.id))
    .limit(bounds.limit)
    .offset(bounds.offset)
    .all()
  const flagged = new Set(
    rows.length === 0
      ? []
      : tx
          .select({ orderId: orderFlag.orderId })
          .from(orderFlag)
          .where(
            and(
              isNull(orderFlag.resolvedAt),
              inArray(
                orderFlag.orderId,
                rows.map(row => row.orderId),
              ),
            ),
          )
          .all()
          .map(row => row.orderId),
  )
  return rows.map(row => ({
    id: row.id,
    number: row.number,
    status: row.status as OrderRowView['status'],
    placedAt: new Date(row.placedAt).toISOString(),
    customerName: row.customerName,
    relationship: row.relationship as OrderRowView['relationship'],
    seller: row.firstName ? `${row.sellerNumber} ${row.firstName} ${row.lastName}` : (row.group ?? ''),
    group: row.group,
    itemCount: row.itemCount,
    totalCents: row.totalCents,
    refundedCents: row.refundedCents,
    flagged: flagged.has(row.orderId),
  }))
}

/** The drive always comes first, so that a forgotten condition finds nothing of anybody else's. */
function toWhere(tx: Tx, driveId: number, query: OrdersQuery): SQL {
  const conditions: SQL[] = [eq(order.driveId, driveId)]
  if (query.ids) conditions.push(inArray(order.publicId, query.ids.split(',')))
  if (query.status) conditions.push(eq(order.status, query.status))
  const search = query.search?.trim()
  if (search) {
    const like = `%${search.replaceAll(/[\\%_]/g, found => `\\${found}`)}%`
    conditions.push(
      isOrderNumber(search)
        ? eq(order.number, normalOrderNumber(search))
        : or(
            sql`${orderCustomer.name} like ${like} escape '\\'`,
            sql`${orderCustomer.email} like ${like} escape '\\'`,
          )!,
    )
  }
  if (query.group || query.seller) {
    const ofSeller = and(
      eq(orderLine.orderId, order.id),
      query.group ? eq(sellerGroup.name, query.group) : undefined,
      query.seller ? eq(seller.number, Number(query.seller)) : undefined,
    )
    conditions.push(
      exists(
        tx
          .select({ one: sql`1` })
          .from(orderLine)
          .innerJoin(seller, eq(seller.id, orderLine.sellerId))
          .innerJoin(sellerGroup, eq(sellerGroup.id, seller.groupId))
          .where(ofSeller),
      ),
    )
  }
  if (query.flagged)
    conditions.push(
      exists(
        tx
          .select({ one: sql`1` })
          .from(orderFlag)
          .where(and(eq(orderFlag.orderId, order.id), isNull(orderFlag.resolvedAt))),
      ),
    )
  return and(...conditions)!
}
