import { z } from 'zod'
import { AppError } from '#shared/errors.ts'
import { refusal } from '#shared/messages/refusals.ts'
import { meReply } from '#shared/people/contract.ts'
import { reply, route } from '../http/route.ts'
import { listDesks } from './queries.ts'
import { secondFactorState } from './second-factor.ts'

export const peopleRoutes = [
  route({
    method: 'get',
    path: '/me',
    summary: 'Who is signed in, and which desks are theirs',
    access: { who: 'signed_in' },
    replies: { 200: meReply },
    handler({ deps, granted }) {
      const person = granted.person!
      const desks = listDesks(deps.db.orm, person.userId)
      return reply(200, {
        name: person.name,
        email: person.email,
        family: desks.family.map(({ firstName, lastName, ...row }) => ({
          ...row,
          name: `${firstName} ${lastName}`,
        })),
        drives: desks.drives,
        staff: desks.staff,
        secondFactor: secondFactorState(deps.db.orm, person.userId),
      })
    },
  }),
  route({
    method: 'post',
    path: '/sign-in/link',
    summary: 'Use up a mailed sign-in link; the mailed page asks for this with a button',
    access: { who: 'anyone' },
    body: z.strictObject({
      token: z.string().regex(/^[A-Za-z0-9_-]{16,128}$/, refusal('thisLinkIsNotComplete')),
    }),
    replies: { 200: z.object({ signedIn: z.boolean() }) },
    async handler({ deps, body, request }) {
      const cookies = await deps.identity.consumeSignInLink(request, body.token)
      if (!cookies)
        throw new AppError('invalid_input', {
          detail: refusal('thisLinkWasUsedAlreadyOr'),
        })
      return reply(200, { signedIn: true }, { 'Set-Cookie': cookies })
    },
  }),
  route({
    method: 'post',
    path: '/sign-out-everywhere',
    summary: 'End every other session of the person who is signed in',
    access: { who: 'signed_in' },
    replies: { 200: z.object({ ended: z.boolean() }) },
    async handler({ deps, request }) {
      await deps.identity.endOtherSessions(request)
      return reply(200, { ended: true })
    },
  }),
]
