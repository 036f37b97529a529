import QRCode from 'qrcode'
import { z } from 'zod'
import { AppError } from '#shared/errors.ts'
import { consentBody, flagBody } from '#shared/sellers/family-contract.ts'
import { publicId } from '#shared/wire.ts'
import type { Granted } from '../http/route.ts'
import { type Access, reply, route } from '../http/route.ts'
import { findCurrentLink } from '../stores/queries.ts'
import { changeLink } from './change-link.ts'
import { setNameShown } from './consent.ts'
import { flagOrder } from './flags.ts'

const guardian = { who: 'guardian' } satisfies Access
const ofSeller = z.object({ sellerId: publicId })
const done = z.object({ done: z.boolean() })

const by = (granted: Granted, requestId: string) => ({
  sellerId: granted.sellerId!,
  driveId: granted.driveId!,
  actor: granted.person!.userId,
  requestId,
})

const linkRoute = (verb: string, to: 'paused' | 'live' | 'replaced', summary: string) =>
  route({
    method: 'post',
    path: `/sellers/:sellerId/link/${verb}`,
    summary,
    access: guardian,
    params: ofSeller,
    body: z.strictObject({}),
    replies: { 200: done },
    handler({ deps, granted, requestId }) {
      changeLink(deps, { ...by(granted, requestId), to })
      return reply(200, { done: true })
    },
  })

export const familyRoutes = [
  linkRoute('pause', 'paused', 'Pause the store link'),
  linkRoute('resume', 'live', 'Resume a paused store link'),
  linkRoute('replace', 'replaced', 'Replace the store link; the old one is dead at once'),
  route({
    method: 'get',
    path: '/sellers/:sellerId/link/qr.svg',
    summary: 'The store link as a QR code',
    access: guardian,
    params: ofSeller,
    replies: { 200: z.string() },
    async handler({ deps, granted }) {
      const link = findCurrentLink(deps.db.orm, granted.sellerId!)
      if (!link) throw new AppError('not_found')
      const svg = await QRCode.toString(`${deps.config.publicUrl}/s/${link.token}`, {
        type: 'svg',
        errorCorrectionLevel: 'M',
        margin: 4,
      })
      return reply(200, svg, { 'Content-Type': 'image/svg+xml' })
    },
  }),
  route({
    method: 'post',
    path: '/sellers/:sellerId/consent',
    summary: 'Agree that the store shows first name and last initial, or take that back',
    access: guardian,
    params: ofSeller,
    body: consentBody,
    replies: { 200: done },
    handler({ deps, granted, body, requestId }) {
      setNameShown(deps, { ...by(granted, requestId), show: body.show })
      return reply(200, { done: true })
    },
  }),
  route({
    method: 'post',
    path: '/sellers/:sellerId/orders/:orderId/flag',
    summary: 'Say that the family does not know who ordered',
    access: guardian,
    params: z.object({ sellerId: publicId, orderId: publicId }),
    body: flagBody,
    replies: { 200: done },
    handler({ deps, granted, params, body, requestId }) {
      flagOrder(deps, { ...by(granted, requestId), orderPublicId: params.orderId, note: body.note })
      return reply(200, { done: true })
    },
  }),
]
