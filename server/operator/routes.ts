import { z } from 'zod'
import { AppError } from '#shared/errors.ts'
import { operatorReply, searchQuery, searchReply, settleBody } from '#shared/operator/contract.ts'
import { publicId } from '#shared/wire.ts'
import type { Deps } from '../deps.ts'
import { type Access, type Granted, reply, route } from '../http/route.ts'
import { listStaffRoles } from '../people/queries.ts'
import { toOperatorView } from './operator-view.ts'
import { type Reach, searchOrders, searchSellers } from './queries.ts'
import { retryLetter, settlePutAside } from './settle-trouble.ts'

const anyStaff = { who: 'staff', roles: ['admin', 'rep', 'clerk', 'warehouse'] } satisfies Access
const adminOrRep = { who: 'staff', roles: ['admin', 'rep'] } satisfies Access
const admin = { who: 'staff', roles: ['admin'] } satisfies Access

/** A rep sees the drives they run; an admin, a clerk and a warehouse worker see all. */
function reachOf(deps: Deps, granted: Granted): Reach {
  const roles = listStaffRoles(deps.db.orm, granted.person!.userId)
  const seesAll = roles.some(role => role !== 'rep')
  return { repUserId: seesAll ? null : granted.person!.userId }
}

export const operatorRoutes = [
  route({
    method: 'get',
    path: '/operator',
    summary: 'Drives by stage, payments put aside and letters that failed',
    access: anyStaff,
    replies: { 200: operatorReply },
    handler({ deps, granted }) {
      const roles = listStaffRoles(deps.db.orm, granted.person!.userId)
      return reply(
        200,
        toOperatorView(deps, {
          reach: reachOf(deps, granted),
          userId: granted.person!.userId,
          roles,
          seesTrouble: roles.includes('admin') || roles.includes('rep'),
        }),
      )
    },
  }),
  route({
    method: 'get',
    path: '/operator/search',
    summary: 'Orders and sellers by name, e-mail or number, within the drives one sees',
    access: adminOrRep,
    query: searchQuery,
    replies: { 200: searchReply },
    handler({ deps, granted, query }) {
      const reach = reachOf(deps, granted)
      return reply(200, {
        orders: searchOrders(deps.db.orm, reach, query.q),
        sellers: searchSellers(deps.db.orm, reach, query.q).flatMap(row =>
          row.number === null
            ? []
            : [
                {
                  driveId: row.driveId,
                  name: `${row.firstName} ${row.lastName}`,
                  number: row.number,
                  organization: row.organization,
                },
              ],
        ),
      })
    },
  }),
  route({
    method: 'post',
    path: '/operator/put-aside/:paymentId/settle',
    summary: 'Note what was done about a payment that was put aside',
    access: admin,
    params: z.object({ paymentId: publicId }),
    body: settleBody,
    replies: { 200: z.object({ settled: z.boolean() }) },
    handler({ deps, granted, params, body, requestId }) {
      settlePutAside(deps, {
        publicId: params.paymentId,
        resolution: body.resolution,
        actor: granted.person!.userId,
        requestId,
      })
      return reply(200, { settled: true })
    },
  }),
  route({
    method: 'post',
    path: '/operator/letters/:letterId/retry',
    summary: 'Send a letter that failed once more',
    access: admin,
    params: z.object({ letterId: z.string().regex(/^\d{1,12}$/) }),
    body: z.strictObject({}),
    replies: { 200: z.object({ queued: z.boolean() }) },
    handler({ deps, granted, params, requestId }) {
      const letterId = Number(params.letterId)
      if (!Number.isSafeInteger(letterId)) throw new AppError('not_found')
      retryLetter(deps, { letterId, actor: granted.person!.userId, requestId })
      return reply(200, { queued: true })
    },
  }),
]
