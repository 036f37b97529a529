import { mkdtempSync, rmSync } from 'node:fs'
import { createServer } from 'node:http'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import Stripe from 'stripe'
import { onTestFinished } from 'vitest'
import { closeServer, listen } from '../listen.ts'
import { startPaymentFake } from './app.ts'

export const SECRET_KEY = 'sk_test_of_the_tests'
export const WEBHOOK_SECRET = 'whsec_of_the_tests'

export type Delivery = { body: string; signature: string; event: Stripe.Event }

/**
 * The stand-in on a free port with books of its own, a receiver for its webhooks, and the official SDK pointed at
 * it. All of it ends with the test.
 */
export async function startForTest(
  options: { now?: () => number; dataDir?: string; answer?: (tries: number) => number | null } = {},
) {
  const dataDir = options.dataDir ?? temporaryFolder()
  const now = options.now ?? Date.now
  const received: Delivery[] = []
  const receiver = createServer(async (req, res) => {
    const pieces: Buffer[] = []
    for await (const piece of req) pieces.push(piece)
    const body = Buffer.concat(pieces).toString('utf8')
    received.push({ body, signature: String(req.headers['stripe-signature']), event: JSON.parse(body) })
    const status = options.answer ? options.answer(received.length) : 200
    // No status: a receiver that takes the event and never answers.
    if (status !== null) res.writeHead(status).end()
  })
  const { server, port: receiverPort } = await listen((req, res) => receiver.emit('request', req, res), 0)
  const fake = await startPaymentFake({
    port: 0,
    dataDir,
    webhookUrl: `http://127.0.0.1:${receiverPort}/api/webhooks/payments`,
    webhookSecret: WEBHOOK_SECRET,
    secretKey: SECRET_KEY,
    now,
  })
  let isClosed = false
  const close = async () => {
    if (isClosed) return
    isClosed = true
    await fake.close()
  }
  onTestFinished(async () => {
    await close()
    await closeServer(server)
  })

  const door = async (method: string, path: string, body?: unknown) => {
    const response = await fetch(`${fake.url}/_test${path}`, {
      method,
      ...(body !== undefined && { body: JSON.stringify(body) }),
    })
    return { status: response.status, body: await response.json() }
  }
  return {
    url: fake.url,
    dataDir,
    received,
    close,
    stripe: sdkFor(fake.port),
    door,
    pay: (sessionId: string, card = '4242424242424242') =>
      door('POST', `/sessions/${sessionId}/pay`, { card }),
    behave: (behaviour: Record<string, unknown>) => door('POST', '/behaviour', behaviour),
    setClock: (instant: number) => door('POST', '/clock', { now: new Date(instant).toISOString() }),
    /** Waits until so many webhooks have come, and a moment longer to see that no more come. */
    async webhooks(count: number, { within = 3_000 } = {}): Promise<Delivery[]> {
      const until = Date.now() + within
      while (received.length < count && Date.now() < until) await pause(10)
      await pause(40)
      return received
    },
  }
}

export function sdkFor(port: number, secretKey = SECRET_KEY): Stripe {
  return new Stripe(secretKey, {
    host: '127.0.0.1',
    port,
    protocol: 'http',
    telemetry: false,
    maxNetworkRetries: 0,
    timeout: 5_000,
  })
}

export function temporaryFolder(): string {
  const folder = mkdtempSync(join(tmpdir(), 'stand-in-'))
  onTestFinished(() => rmSync(folder, { recursive: true, force: true }))
  return folder
}

export const pause = (ms: number) => new Promise(resolve => setTimeout(resolve, ms))

/** A page for 57 dollars in two lines, as a store asks for one. */
export function aSession(changes: Partial<Stripe.Checkout.SessionCreateParams> = {}) {
  return {
    mode: 'payment',
    line_items: [
      {
        quantity: 2,
        price_data: { currency: 'usd', unit_amount: 1_850, product_data: { name: 'Barley soup' } },
      },
      {
        quantity: 1,
        price_data: { currency: 'usd', unit_amount: 2_000, product_data: { name: 'Gift to the crew' } },
      },
    ],
    allowed_payment_method_types: ['card'],
    adaptive_pricing: { enabled: false },
    client_reference_id: 'order-1',
    customer_email: 'ruth@example.org',
    locale: 'en',
    success_url: 'http://localhost:4310/r/abc?session={CHECKOUT_SESSION_ID}',
    cancel_url: 'http://localhost:4310/s/link',
    metadata: { order: 'order-1', lines: '1001x2' },
    payment_intent_data: { metadata: { order: 'order-1' } },
    ...changes,
  } as Stripe.Checkout.SessionCreateParams
}

/** What a call was refused with, as the SDK tells it. */
export async function refusalOf(call: Promise<unknown>): Promise<Stripe.errors.StripeError> {
  return call.then(
    () => {
      throw new Error('the call was not refused')
    },
    error => error,
  )
}
