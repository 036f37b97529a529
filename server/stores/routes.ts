import { z } from 'zod'
import { AppError } from '#shared/errors.ts'
import { refusal } from '#shared/messages/refusals.ts'
import { idempotencyKey, placeOrderBody, placeOrderReply } from '#shared/orders/contract.ts'
import { storeQuery, storeReply } from '#shared/stores/contract.ts'
import { publicId } from '#shared/wire.ts'
import { reply, route } from '../http/route.ts'
import { placeOrder } from '../orders/place-order.ts'
import { findStoreJson } from './store-view.ts'

const params = z.object({ token: publicId })

export const storeRoutes = [
  route({
    method: 'get',
    path: '/stores/:token',
    summary: 'What a store link shows',
    access: { who: 'customer' },
    params,
    query: storeQuery,
    replies: { 200: storeReply },
    handler({ deps, params, query }) {
      const json = findStoreJson(deps.db, {
        token: params.token,
        locale: query.locale ?? 'en',
        now: deps.now(),
      })
      if (json === null) throw new AppError('not_found')
      return reply(200, json, { 'Content-Type': 'application/json; charset=utf-8' })
    },
  }),
  route({
    method: 'post',
    path: '/stores/:token/orders',
    summary: 'Place an order and get the address of the payment page',
    access: { who: 'customer' },
    params,
    headers: { 'Idempotency-Key': 'The same for every try of one order' },
    body: placeOrderBody,
    replies: { 201: placeOrderReply },
    async handler({ deps, params, body, header, requestId }) {
      const key = idempotencyKey.safeParse(header('idempotency-key'))
      if (!key.success)
        throw new AppError('invalid_input', {
          errors: [{ path: 'Idempotency-Key', message: refusal('sendAnIdempotencykeyOf8To') }],
        })
      return reply(
        201,
        await placeOrder(deps, { token: params.token, key: key.data, input: body, requestId }),
      )
    },
  }),
]
