import { z } from 'zod'
import { AppError } from '#shared/errors.ts'
import { receiptReply } from '#shared/orders/contract.ts'
import { publicId } from '#shared/wire.ts'
import { PaymentServiceError } from '../clients/payments.ts'
import { reply, route } from '../http/route.ts'
import { applySession } from './apply-session.ts'
import { findOrder, findSession } from './queries.ts'
import { findReceipt } from './receipt-view.ts'

const params = z.object({ receipt: publicId })

export const receiptRoutes = [
  route({
    method: 'get',
    path: '/receipts/:receipt',
    summary: 'An order, by its private receipt address',
    access: { who: 'customer' },
    params,
    replies: { 200: receiptReply },
    handler({ deps, params }) {
      const view = findReceipt(deps.db, { receipt: params.receipt, publicUrl: deps.config.publicUrl })
      if (!view) throw new AppError('not_found')
      return reply(200, view)
    },
  }),
  route({
    method: 'post',
    path: '/receipts/:receipt/check',
    summary: 'Ask the payment service now, for a customer who has just come back from it',
    access: { who: 'customer' },
    params,
    replies: { 200: receiptReply },
    async handler({ deps, params }) {
      const order = findOrder(deps.db.orm, params.receipt)
      if (!order) throw new AppError('not_found')
      const session = order.status === 'awaiting_payment' ? findSession(deps.db.orm, order.id) : null
      if (session)
        try {
          applySession(deps, await deps.payments.getSession(session.sessionId))
        } catch (error) {
          // The service does not answer: the customer sees the order as we know it, the reconciler asks again.
          if (!(error instanceof PaymentServiceError)) throw error
        }
      return reply(200, findReceipt(deps.db, { receipt: params.receipt, publicUrl: deps.config.publicUrl }))
    },
  }),
]
