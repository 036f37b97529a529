import Stripe from 'stripe'
import type { Config } from '../config.ts'

/** What the payment service says of one of its pages, as far as we use it. */
export type SessionState = {
  sessionId: string
  url: string | null
  status: 'open' | 'complete' | 'expired'
  paid: boolean
  amountTotalCents: number
  currency: string
  expiresAt: number
  paymentIntentId: string | null
  orderPublicId: string | null
  metadata: Record<string, string>
}

export type StartPayment = {
  /** The order's public id: the same at every try, so that the service makes one page only. */
  orderPublicId: string
  lines: { name: string; unitCents: number; quantity: number }[]
  customerEmail: string
  locale: 'en' | 'es'
  successUrl: string
  cancelUrl: string
  expiresAt: number
  /** Enough to rebuild the order from the service's book after an older backup was restored. */
  metadata: Record<string, string>
}

/** Why a call to the payment service failed. `unsure`: it may have been carried out; ask again with the same key. */
export class PaymentServiceError extends Error {
  readonly kind: 'unsure' | 'refused'
  readonly code: string | undefined
  constructor(kind: 'unsure' | 'refused', message: string, code?: string) {
    super(message)
    this.name = 'PaymentServiceError'
    this.kind = kind
    this.code = code
  }
}

export type PaymentAnnouncement = {
  eventId: string
  type: string
  createdAt: number
  session: SessionState | null
  /** For refund events: the payment they belong to. */
  paymentIntentId: string | null
}

export type Payments = ReturnType<typeof makePayments>

const API_VERSION = '2026-10-28.endive'
/** A stamp further ahead than this is no clock drift; the SDK itself would let it pass. */
const MAX_AHEAD_SECONDS = 300

/** The official SDK behind the few calls we make, each bounded in time. */
export function makePayments(config: Config, now: () => number) {
  const base = config.stripe.apiBase ? new URL(config.stripe.apiBase) : null
  const stripe = new Stripe(config.stripe.secretKey, {
    apiVersion: API_VERSION,
    telemetry: false,
    timeout: 15_000,
    maxNetworkRetries: 1,
    ...(base && {
      host: base.hostname,
      port: base.port || '80',
      protocol: base.protocol === 'https:' ? ('https' as const) : ('http' as const),
    }),
  })

  return {
    async startPayment(start: StartPayment): Promise<SessionState> {
      const session = await call(() =>
        stripe.checkout.sessions.create(
          {
            mode: 'payment',
            line_items: start.lines.map(line => ({
              quantity: line.quantity,
              price_data: {
                currency: 'usd',
                unit_amount: line.unitCents,
                product_data: { name: line.name },
              },
            })),
            allowed_payment_method_types: ['card'],
            adaptive_pricing: { enabled: false },
            client_reference_id: start.orderPublicId,
            customer_email: start.customerEmail,
            locale: start.locale,
            success_url: start.successUrl,
            cancel_url: start.cancelUrl,
            expires_at: Math.floor(start.expiresAt / 1000),
            metadata: start.metadata,
            payment_intent_data: { metadata: { order: start.orderPublicId } },
          } as Stripe.Checkout.SessionCreateParams,
          { idempotencyKey: `order_${start.orderPublicId}` },
        ),
      )
      return toState(session)
    },

    async getSession(sessionId: string): Promise<SessionState> {
      return toState(await call(() => stripe.checkout.sessions.retrieve(sessionId)))
    },

    /** Ends a page that is still open. Answers what the service then says; a page already paid stays paid. */
    async expireSession(sessionId: string): Promise<SessionState> {
      try {
        return toState(await call(() => stripe.checkout.sessions.expire(sessionId)))
      } catch (error) {
        if (error instanceof PaymentServiceError && error.kind === 'refused')
          return toState(await call(() => stripe.checkout.sessions.retrieve(sessionId)))
        throw error
      }
    },

    /** All pages made since an instant, oldest page of results last. */
    async *listSessionsSince(since: number): AsyncGenerator<SessionState> {
      let after: string | undefined
      for (;;) {
        const page = await call(() =>
          stripe.checkout.sessions.list({
            limit: 100,
            created: { gte: Math.floor(since / 1000) },
            ...(after && { starting_after: after }),
          }),
        )
        for (const session of page.data) yield toState(session)
        after = page.data.at(-1)?.id
        if (!page.has_more || !after) return
      }
    },

    async refund(options: { refundPublicId: string; paymentIntentId: string; amountCents: number }) {
      const refund = await call(() =>
        stripe.refunds.create(
          {
            payment_intent: options.paymentIntentId,
            amount: options.amountCents,
            metadata: { refund: options.refundPublicId },
          },
          { idempotencyKey: `refund_${options.refundPublicId}` },
        ),
      )
      return { providerRefundId: refund.id, status: refund.status ?? 'pending' }
    },

    async getRefund(providerRefundId: string) {
      const refund = await call(() => stripe.refunds.retrieve(providerRefundId))
      return { providerRefundId: refund.id, status: refund.status ?? 'pending' }
    },

    /** Verifies a webhook's signature over the raw body and reads what it announces. Throws when it is not genuine. */
    readAnnouncement(rawBody: Buffer, signature: string): PaymentAnnouncement {
      const stamp = Number(/(?:^|,)t=(\d+)/.exec(signature)?.[1])
      if (!(stamp <= now() / 1000 + MAX_AHEAD_SECONDS)) throw new Error('stamp in the future')
      const event = stripe.webhooks.constructEvent(
        rawBody,
        signature,
        config.stripe.webhookSecret,
        // The tolerance stays the SDK's own; an explicit 0 would switch the age check off.
        undefined,
        undefined,
        now(),
      )
      const object = event.data.object as unknown as Record<string, unknown>
      const isSession = object.object === 'checkout.session'
      return {
        eventId: event.id,
        type: event.type,
        createdAt: event.created * 1000,
        session: isSession ? toState(object as unknown as Stripe.Checkout.Session) : null,
        paymentIntentId: typeof object.payment_intent === 'string' ? object.payment_intent : null,
      }
    },
  }
}

async function call<T>(request: () => Promise<T>): Promise<T> {
  try {
    return await request()
  } catch (error) {
    if (error instanceof Stripe.errors.StripeInvalidRequestError)
      throw new PaymentServiceError('refused', error.message, error.code)
    if (error instanceof Stripe.errors.StripeError)
      throw new PaymentServiceError('unsure', error.message, error.code)
    throw error
  }
}

function toState(session: Stripe.Checkout.Session): SessionState {
  const intent = session.payment_intent
  return {
    sessionId: session.id,
    url: session.url,
    status: (session.status ?? 'open') as SessionState['status'],
    paid: session.payment_status === 'paid',
    amountTotalCents: session.amount_total ?? 0,
    currency: session.currency ?? '',
    expiresAt: session.expires_at * 1000,
    paymentIntentId: typeof intent === 'string' ? intent : (intent?.id ?? null),
    orderPublicId: session.client_reference_id,
    metadata: session.metadata ?? {},
  }
}
