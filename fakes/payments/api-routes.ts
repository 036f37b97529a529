import { setTimeout as sleep } from 'node:timers/promises'
import express, { type Request, type Response, Router } from 'express'
import Stripe from 'stripe'
import { ApiError, invalidRequest, notFound, serverError } from './api-error.ts'
import { expand } from './expand.ts'
import type { Fake } from './fake.ts'
import { type Answer, idempotencyLayer } from './idempotency.ts'
import { newRequestId } from './ids.ts'
import { listPage } from './lists.ts'
import { type Params, readParams } from './params.ts'
import { getRefund, prepareRefund } from './refunds.ts'
import { expireOverdue, expireSession, getSession, prepareSession } from './sessions.ts'

type Call = { params: Params; id: string }

/** The calls of the payment API that the official SDK makes, under `/v1`. */
export function apiRoutes(fake: Fake, secretKey: string | undefined): Router {
  const router = Router()
  const keys = idempotencyLayer(fake.books, fake.clock.now)

  function get(path: string, read: (call: Call) => unknown): void {
    router.get(path, async (req, res) => {
      failWhenTold(fake)
      await takeTime(fake)
      const params = readParams(queryOf(req))
      const paths = params.list('expand')
      const body = fake.books.transaction(() => {
        const found = read({ params, id: String(req.params.id) })
        params.refuseUnread()
        return expand(fake, found, paths)
      })
      send(fake, res, { status: 200, body, replayed: false })
    })
  }

  function post(path: string, prepare: (call: Call) => () => unknown): void {
    router.post(path, async (req, res) => {
      failWhenTold(fake)
      const key = req.get('idempotency-key') ?? null
      const release = keys.hold(key)
      try {
        await takeTime(fake)
        const encoded = typeof req.body === 'string' ? req.body : ''
        const answer = keys.run({ key, endpoint: `/v1${req.path}`, encoded }, () => {
          const params = readParams(encoded)
          const paths = params.list('expand')
          const deed = prepare({ params, id: String(req.params.id) })
          params.refuseUnread()
          const breaks = fake.behaviour.use('breakNextCalls')
          return () => {
            const done = expand(fake, deed(), paths)
            if (breaks) throw serverError('An unknown error occurred while the request was carried out.')
            return done
          }
        })
        if (key !== null) res.set('idempotency-key', key)
        send(fake, res, answer)
      } finally {
        release()
      }
    })
  }

  router.use((req, res, next) => {
    res.set('request-id', newRequestId()).set('stripe-version', Stripe.API_VERSION)
    refuseStranger(req, secretKey)
    refuseOtherVersion(req)
    next()
  })
  router.use(express.text({ type: 'application/x-www-form-urlencoded', limit: '1mb' }))

  post('/checkout/sessions', ({ params }) => prepareSession(fake, params))
  post(
    '/checkout/sessions/:id/expire',
    ({ id }) =>
      () =>
        expireSession(fake, id),
  )
  get('/checkout/sessions', ({ params }) => {
    expireOverdue(fake)
    return listPage(fake, 'checkout.session', params)
  })
  get('/checkout/sessions/:id', ({ id }) => getSession(fake, id))
  get('/payment_intents/:id', ({ id }) => {
    const intent = fake.books.find('payment_intent', id)
    if (!intent) throw notFound('payment_intent', id)
    return intent
  })
  post('/refunds', ({ params }) => prepareRefund(fake, params))
  get('/refunds', ({ params }) => listPage(fake, 'refund', params))
  get('/refunds/:id', ({ id }) => getRefund(fake, id))
  get('/events', ({ params }) => listPage(fake, 'event', params))
  get('/events/:id', ({ id }) => {
    const event = fake.books.find('event', id)
    if (!event) throw notFound('event', id)
    return event
  })

  router.use(req => {
    throw new ApiError(404, {
      type: 'invalid_request_error',
      message: `Unrecognized request URL (${req.method}: /v1${req.path}).`,
    })
  })
  return router
}

/** The front door: an outage ordered by a test ends the call here, before anything is done or remembered. */
function failWhenTold(fake: Fake): void {
  if (fake.behaviour.use('failNextCalls'))
    throw serverError('The payment stand-in was told to fail this call.', fake.behaviour.current.failStatus)
}

async function takeTime(fake: Fake): Promise<void> {
  const { latencyMs } = fake.behaviour.current
  if (latencyMs > 0) await sleep(latencyMs)
}

function send(fake: Fake, res: Response, answer: Answer): void {
  if (answer.replayed) res.set('idempotent-replayed', 'true')
  // A remembered 500 would only be given again.
  if (answer.status >= 500) res.set('stripe-should-retry', 'false')
  if (fake.behaviour.use('loseNextAnswers')) return void res.socket?.destroy()
  const text = JSON.stringify(answer.body, null, 2)
  res.status(answer.status).type('json')
  if (!fake.behaviour.use('truncateNextAnswers')) return void res.send(text)
  res.set('content-length', String(Buffer.byteLength(text)))
  res.write(text.slice(0, text.length / 2), () => res.socket?.destroy())
}

/** The key comes as a bearer token, or as the user name of basic authentication. */
function refuseStranger(req: Request, secretKey: string | undefined): void {
  const header = req.get('authorization') ?? ''
  const basic = /^Basic (.+)$/i.exec(header)?.[1]
  const given = basic
    ? Buffer.from(basic, 'base64').toString('utf8').split(':')[0]
    : /^Bearer (.+)$/i.exec(header)?.[1]
  if (!given)
    throw new ApiError(401, {
      type: 'invalid_request_error',
      message: 'You did not provide an API key. Provide it in the Authorization header, using Bearer auth.',
    })
  if (secretKey !== undefined && given !== secretKey)
    throw new ApiError(401, {
      type: 'invalid_request_error',
      message: `Invalid API Key provided: ${given.slice(0, 8)}${'*'.repeat(8)}${given.slice(-4)}`,
    })
}

/** Without the header the account's own version holds; the official SDK always sends the one it was built for. */
function refuseOtherVersion(req: Request): void {
  const version = req.get('stripe-version')
  if (version !== undefined && version !== Stripe.API_VERSION)
    throw invalidRequest(
      `Invalid Stripe API version: ${version}. This stand-in speaks ${Stripe.API_VERSION}.`,
    )
}

function queryOf(req: Request): string {
  const at = req.originalUrl.indexOf('?')
  return at < 0 ? '' : req.originalUrl.slice(at + 1)
}
