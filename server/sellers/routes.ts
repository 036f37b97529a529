import { z } from 'zod'
import { storeStatus } from '#shared/deadline/store-status.ts'
import type { OrderStatus, Relationship } from '#shared/orders/contract.ts'
import { type SellerView, sellerReply } from '#shared/sellers/contract.ts'
import { nextPrize } from '#shared/tally/tally.ts'
import { publicId } from '#shared/wire.ts'
import type { Deps } from '../deps.ts'
import { reply, route } from '../http/route.ts'
import { sellerTotals } from '../orders/tallies.ts'
import { findCurrentLink } from '../stores/queries.ts'
import { getSeller, listCreditedOrders, listFlaggedOrders } from './queries.ts'

const RECENT_ORDERS = 100

export const sellerRoutes = [
  route({
    method: 'get',
    path: '/sellers/:sellerId',
    summary: 'A seller as the family sees them: tally, next prize, credited orders, the link',
    access: { who: 'guardian' },
    params: z.object({ sellerId: publicId }),
    replies: { 200: sellerReply },
    handler({ deps, granted }) {
      return reply(200, toSellerView(deps, granted.sellerId!))
    },
  }),
]

/** The family's view of a seller. The customer's e-mail address is not part of it. */
export function toSellerView(deps: Deps, sellerId: number): SellerView {
  const { orm } = deps.db
  const row = getSeller(orm, sellerId)
  const link = findCurrentLink(orm, sellerId)
  const totals = sellerTotals(orm, sellerId)
  const flagged = listFlaggedOrders(orm, sellerId)
  const prize = nextPrize(totals.marks, row.prizeEvery)
  return {
    sellerId: row.publicId,
    fullName: `${row.firstName} ${row.lastName}`,
    displayName: `${row.firstName} ${[...row.lastName][0] ?? ''}.`,
    number: row.number ?? 0,
    group: row.group,
    nameShown: row.nameShownSince !== null,
    organization: row.organization,
    drive: {
      name: row.driveName,
      status: storeStatus(
        { ...row, linkPaused: link?.state === 'paused', launched: row.launchedAt !== null },
        deps.now(),
      ),
      opensAt: new Date(row.opensAt).toISOString(),
      closesAt: new Date(row.closedEarlyAt ?? row.closesAt).toISOString(),
      timeZone: row.timeZone,
      deliveryFrom: row.deliveryFrom,
      deliveryTo: row.deliveryTo,
    },
    link: link && {
      url: `${deps.config.publicUrl}/s/${link.token}`,
      state: link.state === 'paused' ? 'paused' : 'live',
    },
    tally: {
      items: totals.items,
      amountCents: totals.amountCents,
      prizeEvery: row.prizeEvery,
      prizesEarned: prize.earned,
      itemsToNextPrize: prize.toNext,
    },
    orders: listCreditedOrders(orm, sellerId, RECENT_ORDERS).map(order => ({
      id: order.publicId,
      orderNumber: order.number,
      customerName: order.customerName,
      relationship: order.relationship as Relationship,
      placedAt: new Date(order.placedAt).toISOString(),
      status: order.status as OrderStatus,
      flagged: flagged.has(order.id),
      itemCount: order.lines.reduce((sum, line) => sum + line.quantity - line.refundedQuantity, 0),
      lines: order.lines.map(line => ({ itemCode: line.code, name: line.name, quantity: line.quantity })),
    })),
  }
}
