import {
  beginSecondFactorBody,
  beginSecondFactorReply,
  proveSecondFactorBody,
  recoveryCodesReply,
  renewRecoveryCodesBody,
  secondFactorReply,
} from '#shared/people/second-factor.ts'
import { reply, route } from '../http/route.ts'
import { hasSecondFactor } from './second-factor.ts'
import { beginSecondFactor, proveSecondFactor, renewRecoveryCodes } from './set-up-second-factor.ts'

export const secondFactorRoutes = [
  route({
    method: 'get',
    path: '/account/second-factor',
    summary: 'Whether one has set up a second factor, and how many recovery codes are left',
    access: { who: 'signed_in' },
    replies: { 200: secondFactorReply },
    async handler({ deps, granted }) {
      const { userId } = granted.person!
      const isOn = hasSecondFactor(deps.db.orm, userId)
      const left = isOn ? await deps.identity.secondFactor.listRecoveryCodes(userId) : []
      return reply(200, { isOn, recoveryCodesLeft: left.length })
    },
  }),
  route({
    method: 'post',
    path: '/account/second-factor',
    summary: 'Begin to set up an authenticator app; takes the password again',
    access: { who: 'signed_in' },
    body: beginSecondFactorBody,
    replies: { 200: beginSecondFactorReply },
    async handler({ deps, granted, body, request }) {
      return reply(200, await beginSecondFactor(deps, { person: granted.person!, request, ...body }))
    },
  }),
  route({
    method: 'post',
    path: '/account/second-factor/prove',
    summary: 'Finish the set-up with a first code; ends all other sessions, answers the recovery codes',
    access: { who: 'signed_in' },
    body: proveSecondFactorBody,
    replies: { 200: recoveryCodesReply },
    async handler({ deps, granted, body, request, requestId }) {
      const done = await proveSecondFactor(deps, { person: granted.person!, request, requestId, ...body })
      return reply(200, { recoveryCodes: done.recoveryCodes }, { 'Set-Cookie': done.cookies })
    },
  }),
  route({
    method: 'post',
    path: '/account/second-factor/recovery-codes',
    summary: 'Make new recovery codes, which end the old ones; takes the password again',
    access: { who: 'signed_in' },
    body: renewRecoveryCodesBody,
    replies: { 200: recoveryCodesReply },
    async handler({ deps, granted, body, request, requestId }) {
      const codes = await renewRecoveryCodes(deps, { person: granted.person!, request, requestId, ...body })
      return reply(200, { recoveryCodes: codes })
    },
  }),
]
