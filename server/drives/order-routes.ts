import { z } from 'zod'
import {
  closeAtBody,
  closeAtReply,
  moveBody,
  orderPageReply,
  ordersQuery,
  ordersReply,
  refundBody,
  refundReply,
} from '#shared/drives/orders-contract.ts'
import { resolveFlagBody } from '#shared/sellers/family-contract.ts'
import { publicId } from '#shared/wire.ts'
import { resolveFlags } from '../families/flags.ts'
import { type Access, type Granted, reply, route } from '../http/route.ts'
import { moveOrder } from '../orders/move-order.ts'
import { refundOrder } from '../orders/refund-order.ts'
import { closeAt } from './close-at.ts'
import { getOrderOfDrive, toOrderPage } from './order-page.ts'
import { ordersCsv } from './orders-csv.ts'
import { listOrders } from './orders-table.ts'

const ofDrive = z.object({ driveId: publicId })
const ofOrder = z.object({ driveId: publicId, orderId: publicId })

const seeing = {
  who: 'drive',
  roles: ['lead', 'treasurer', 'helper'],
  staff: ['rep', 'admin'],
} satisfies Access
const refunding = { who: 'drive', roles: ['lead', 'treasurer'], staff: ['rep', 'admin'] } satisfies Access
const leading = { who: 'drive', roles: ['lead'], staff: ['rep', 'admin'] } satisfies Access

const isOneOf = (granted: Granted, access: Extract<Access, { who: 'drive' }>) =>
  [...access.roles, ...access.staff].some(role => role === granted.role)

export const orderRoutes = [
  route({
    method: 'get',
    path: '/drives/:driveId/orders',
    summary: 'Orders of a drive: searched, filtered, sorted and paged',
    access: seeing,
    params: ofDrive,
    query: ordersQuery,
    replies: { 200: ordersReply },
    handler: ({ deps, granted, query }) => reply(200, listOrders(deps, granted.driveId!, query)),
  }),
  route({
    method: 'get',
    path: '/drives/:driveId/orders.csv',
    summary: 'The same orders for a spreadsheet',
    access: refunding,
    params: ofDrive,
    query: ordersQuery,
    replies: { 200: z.string() },
    handler: ({ deps, granted, query }) =>
      reply(200, ordersCsv(deps, granted.driveId!, query), {
        'Content-Type': 'text/csv; charset=utf-8',
        'Content-Disposition': 'attachment; filename="orders.csv"',
      }),
  }),
  route({
    method: 'get',
    path: '/drives/:driveId/orders/:orderId',
    summary: 'An order with its whole history',
    access: seeing,
    params: ofOrder,
    replies: { 200: orderPageReply },
    handler: ({ deps, granted, params }) =>
      reply(
        200,
        toOrderPage(deps, {
          driveId: granted.driveId!,
          orderPublicId: params.orderId,
          mayRefund: isOneOf(granted, refunding),
          mayMove: isOneOf(granted, leading),
        }),
      ),
  }),
  route({
    method: 'post',
    path: '/drives/:driveId/orders/:orderId/refunds',
    summary: 'Give back an order or some of its lines, through the payment service',
    access: refunding,
    params: ofOrder,
    body: refundBody,
    replies: { 201: refundReply },
    async handler({ deps, granted, params, body, requestId }) {
      const row = getOrderOfDrive(deps.db.orm, granted.driveId!, params.orderId)
      const refund = await refundOrder(deps, {
        orderPublicId: row.publicId,
        what: body.what,
        reason: body.reason,
        actor: granted.person!.userId,
        requestId,
      })
      return reply(201, { amountCents: refund.amountCents, state: refund.state })
    },
  }),
  route({
    method: 'post',
    path: '/drives/:driveId/orders/:orderId/move',
    summary: 'Credit an order to the seller it was meant for',
    access: leading,
    params: ofOrder,
    body: moveBody,
    replies: { 200: z.object({ moved: z.boolean() }) },
    handler({ deps, granted, params, body, requestId }) {
      const row = getOrderOfDrive(deps.db.orm, granted.driveId!, params.orderId)
      moveOrder(deps, {
        orderPublicId: row.publicId,
        sellerNumber: body.sellerNumber,
        actor: granted.person!.userId,
        reason: body.reason,
        requestId,
      })
      return reply(200, { moved: true })
    },
  }),
  route({
    method: 'post',
    path: '/drives/:driveId/orders/:orderId/flags/settle',
    summary: 'Settle a flag: the person is known after all',
    access: refunding,
    params: ofOrder,
    body: resolveFlagBody,
    replies: { 200: z.object({ settled: z.boolean() }) },
    handler({ deps, granted, params, body, requestId }) {
      const row = getOrderOfDrive(deps.db.orm, granted.driveId!, params.orderId)
      resolveFlags(deps, {
        orderId: row.id,
        resolution: 'known',
        actor: granted.person!.userId,
        reason: body.reason,
        requestId,
      })
      return reply(200, { settled: true })
    },
  }),
  route({
    method: 'post',
    path: '/drives/:driveId/close-at',
    summary: 'Close at another time: earlier, later, or open again',
    access: leading,
    params: ofDrive,
    body: closeAtBody,
    replies: { 200: closeAtReply },
    handler({ deps, granted, body, requestId }) {
      const moved = closeAt(deps, {
        driveId: granted.driveId!,
        date: body.date,
        time: body.time,
        actor: granted.person!.userId,
        reason: body.reason,
        requestId,
      })
      return reply(200, {
        closesAt: new Date(moved.closesAt).toISOString(),
        before: new Date(moved.before).toISOString(),
      })
    },
  }),
]
