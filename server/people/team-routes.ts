import { z } from 'zod'
import {
  resetSecondFactorBody,
  resetSecondFactorReply,
  teamReply,
  userId,
} from '#shared/people/second-factor.ts'
import { publicId } from '#shared/wire.ts'
import { reply, route } from '../http/route.ts'
import { resetMemberFactor, resetStaffFactor } from './reset-second-factor.ts'
import { listTeam } from './team.ts'

export const teamRoutes = [
  route({
    method: 'get',
    path: '/drives/:driveId/team',
    summary: 'The people of a drive, their roles, and who has a second factor',
    access: { who: 'drive', roles: ['lead', 'treasurer', 'helper'], staff: ['rep', 'admin'] },
    params: z.object({ driveId: publicId }),
    replies: { 200: teamReply },
    handler({ deps, granted }) {
      const members = listTeam(deps.db.orm, {
        driveId: granted.driveId!,
        asker: { userId: granted.person!.userId, role: granted.role! },
      })
      return reply(200, { members })
    },
  }),
  route({
    method: 'post',
    path: '/drives/:driveId/members/:userId/reset-second-factor',
    summary: 'Take a lost second factor off a member of the drive, with a reason',
    access: { who: 'drive', roles: ['lead'], staff: ['rep', 'admin'] },
    params: z.object({ driveId: publicId, userId }),
    body: resetSecondFactorBody,
    replies: { 200: resetSecondFactorReply },
    handler({ deps, granted, params, body, requestId }) {
      resetMemberFactor(deps, {
        by: granted.person!,
        role: granted.role,
        driveId: granted.driveId!,
        userId: params.userId,
        reason: body.reason,
        requestId,
      })
      return reply(200, { reset: true })
    },
  }),
  route({
    method: 'post',
    path: '/staff/:userId/reset-second-factor',
    summary: "Take a lost second factor off one of the operator's people, with a reason",
    access: { who: 'staff', roles: ['admin'] },
    params: z.object({ userId }),
    body: resetSecondFactorBody,
    replies: { 200: resetSecondFactorReply },
    handler({ deps, granted, params, body, requestId }) {
      resetStaffFactor(deps, {
        by: granted.person!,
        userId: params.userId,
        reason: body.reason,
        requestId,
      })
      return reply(200, { reset: true })
    },
  }),
]
