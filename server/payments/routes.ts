import { z } from 'zod'
import { reply, route } from '../http/route.ts'
import { receiveEvent } from './receive-event.ts'

export const paymentRoutes = [
  route({
    method: 'post',
    path: '/webhooks/payments',
    summary: 'What the payment service announces, signed over the raw body',
    access: { who: 'payment_service' },
    rawBody: true,
    headers: { 'Stripe-Signature': 'The payment service signs the raw body' },
    replies: { 200: z.object({ received: z.boolean() }) },
    async handler({ deps, rawBody, header }) {
      await receiveEvent(deps, { rawBody, signature: header('stripe-signature') })
      return reply(200, { received: true })
    },
  }),
]
