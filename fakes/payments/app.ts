import express, { type ErrorRequestHandler } from 'express'
import Stripe from 'stripe'
import { settableClock } from '../clock.ts'
import { closeServer, listen } from '../listen.ts'
import { ApiError, serverError } from './api-error.ts'
import { apiRoutes } from './api-routes.ts'
import { behaviourSwitch } from './behaviour.ts'
import { openBooks } from './books.ts'
import { type Fake, seconds } from './fake.ts'
import { newEventId } from './ids.ts'
import { payRoutes } from './pay-routes.ts'
import { expireOverdue } from './sessions.ts'
import { testDoors } from './test-doors.ts'
import { startWebhookSender } from './webhook-sender.ts'

export type PaymentFakeOptions = {
  /** 0 takes a free one. */
  port: number
  /** Its books are kept in `payment-fake/` below this folder. */
  dataDir: string
  /** Where events are delivered; a function when the receiver is not listening yet. */
  webhookUrl: string | (() => string)
  webhookSecret: string
  /** Where browsers reach the card page; by default the address it listens on. */
  publicUrl?: string
  /** The stand-in's clock, in milliseconds since 1970 UTC. */
  now: () => number
  /** When given, no other key is let in. */
  secretKey?: string
}

const SWEEP_MS = 1_000

/**
 * Starts the stand-in for the payment service: the API calls of the official SDK under `/v1`, the card page under
 * `/pay`, doors for tests under `/_test`, and signed webhooks to the given address.
 */
export async function startPaymentFake(options: PaymentFakeOptions): Promise<{
  url: string
  port: number
  close(): Promise<void>
}> {
  const books = openBooks(options.dataDir)
  const clock = settableClock(options.now)
  const behaviour = behaviourSwitch()
  const sender = startWebhookSender({
    books,
    url: options.webhookUrl,
    secret: options.webhookSecret,
    now: clock.now,
    behaviour: behaviour.current,
  })

  const fake: Fake = {
    books,
    clock,
    behaviour,
    publicUrl: options.publicUrl ?? '',
    announce(type, object, more = {}) {
      const event = {
        id: newEventId(),
        object: 'event',
        api_version: more.apiVersion ?? Stripe.API_VERSION,
        created: seconds(fake),
        data: { object, ...(more.previous && { previous_attributes: more.previous }) },
        livemode: false,
        pending_webhooks: 1,
        request: { id: null, idempotency_key: null },
        type,
        ...(more.account !== undefined && { account: more.account }),
      } as unknown as Stripe.Event
      books.save(event)
      sender.queue(event.id)
      return event
    },
  }

  const app = express()
  app.disable('x-powered-by')
  app.get('/healthz', (_req, res) => {
    res.json({ status: 'ok' })
  })
  app.use('/v1', apiRoutes(fake, options.secretKey))
  app.use('/_test', testDoors(fake, sender))
  app.use('/pay', payRoutes(fake))
  app.use((req, _res, next) =>
    next(new ApiError(404, { type: 'invalid_request_error', message: `Nothing is at ${req.path}.` })),
  )
  app.use(answerProblem)

  const { server, port } = await listen(app, options.port).catch(error => {
    books.close()
    throw error
  })
  const url = `http://127.0.0.1:${port}`
  fake.publicUrl ||= url
  const sweep = setInterval(() => expireOverdue(fake), SWEEP_MS)
  sweep.unref()
  sender.wake()

  return {
    url,
    port,
    async close() {
      clearInterval(sweep)
      await Promise.all([closeServer(server), sender.close()])
      books.close()
    },
  }
}

const answerProblem: ErrorRequestHandler = (error, _req, res, _next) => {
  const known = error instanceof ApiError ? error : unreadable(error)
  if (!known) console.error(error)
  const answer = known ?? serverError('The payment stand-in met a problem of its own.')
  res.status(answer.status).json(answer.body)
}

/** A body that could not be read is the caller's doing, and the parser says so by its status. */
function unreadable(error: { status?: unknown; message?: unknown }): ApiError | null {
  if (typeof error?.status !== 'number' || error.status >= 500) return null
  return new ApiError(error.status, { type: 'invalid_request_error', message: String(error.message) })
}
