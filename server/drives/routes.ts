import { z } from 'zod'
import { closeEarlyBody, closeEarlyReply, driveReply } from '#shared/drives/contract.ts'
import { publicId } from '#shared/wire.ts'
import { reply, route } from '../http/route.ts'
import { closeEarly } from './close-early.ts'
import { toDriveView } from './drive-view.ts'

const params = z.object({ driveId: publicId })

export const driveRoutes = [
  route({
    method: 'get',
    path: '/drives/:driveId',
    summary: 'A drive as its organizer sees it: what was sold, by group and seller',
    access: { who: 'drive', roles: ['lead', 'treasurer', 'helper'], staff: ['rep', 'admin'] },
    params,
    replies: { 200: driveReply },
    handler({ deps, granted }) {
      return reply(200, toDriveView(deps, granted.driveId!, granted.role!))
    },
  }),
  route({
    method: 'post',
    path: '/drives/:driveId/close',
    summary: 'Close the stores of a drive now, with a reason',
    access: { who: 'drive', roles: ['lead'], staff: ['rep', 'admin'] },
    params,
    body: closeEarlyBody,
    replies: { 200: closeEarlyReply },
    handler({ deps, granted, body, requestId }) {
      const closed = closeEarly(deps, {
        driveId: granted.driveId!,
        actor: granted.person!.userId,
        reason: body.reason,
        requestId,
      })
      return reply(200, {
        closedAt: new Date(closed.closedAt).toISOString(),
        awaitingPayment: closed.awaitingPayment,
      })
    },
  }),
]
