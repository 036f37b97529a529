import { invalidRequest } from './api-error.ts'
import { cardOf } from './cards.ts'
import type { Fake } from './fake.ts'
import { newCharge, newPaymentIntent, newRefund } from './money-objects.ts'
import { withRefunded } from './refunds.ts'
import { detailsOf, newSession } from './session-object.ts'

/** A session that was paid in the past, with what was given back of it. Instants in Unix seconds. */
export type PaidSession = {
  id: string
  paymentIntentId: string
  amountTotalCents: number
  currency: string
  created: number
  clientReferenceId: string | null
  metadata: Record<string, string>
  customerEmail: string | null
  refunds?: { id: string; amountCents: number; created: number; metadata?: Record<string, string> }[]
}

const CARD = cardOf('4242424242424242')

/** Loads paid sessions with their payments, charges and refunds, all or none, and announces nothing. */
export function importSessions(fake: Fake, sessions: unknown): number {
  if (!Array.isArray(sessions)) throw invalidRequest('Send {"sessions": [...]}.', { param: 'sessions' })
  fake.books.transaction(() => {
    sessions.forEach((session, at) => {
      refuseUnsound(session, `sessions[${at}]`)
      importOne(fake, session)
    })
  })
  return sessions.length
}

function importOne(fake: Fake, paid: PaidSession): void {
  const { books } = fake
  const common = { created: paid.created, amountCents: paid.amountTotalCents, currency: paid.currency }
  const refunds = paid.refunds ?? []
  const intent = newPaymentIntent({ ...common, id: paid.paymentIntentId, metadata: {}, receiptEmail: null })
  const charge = newCharge({
    ...common,
    // Derived, so that loading the same session twice leaves one charge.
    id: `ch_${paid.paymentIntentId.replace(/^pi_/, '')}`,
    metadata: {},
    paymentIntentId: intent.id,
    card: CARD,
    name: null,
    email: paid.customerEmail,
  })
  const session = newSession({
    id: paid.id,
    url: '',
    created: paid.created,
    expiresAt: paid.created + 30 * 60,
    amountTotalCents: paid.amountTotalCents,
    currency: paid.currency,
    clientReferenceId: paid.clientReferenceId,
    customerEmail: paid.customerEmail,
    locale: null,
    metadata: paid.metadata,
    successUrl: `${fake.publicUrl}/`,
    cancelUrl: null,
    adaptivePricing: false,
  })
  books.save({ ...intent, status: 'succeeded', amount_received: intent.amount, latest_charge: charge.id })
  books.save(
    withRefunded(
      charge,
      refunds.reduce((sum, refund) => sum + refund.amountCents, 0),
    ),
  )
  books.save({
    ...session,
    status: 'complete',
    payment_status: 'paid',
    payment_intent: intent.id,
    url: null,
    customer_details: detailsOf(paid.customerEmail, null),
  })
  for (const refund of refunds) {
    books.save(
      newRefund({
        id: refund.id,
        created: refund.created,
        amountCents: refund.amountCents,
        currency: paid.currency,
        metadata: refund.metadata ?? {},
        paymentIntentId: intent.id,
        chargeId: charge.id,
        reason: null,
      }),
    )
  }
}

function refuseUnsound(session: Partial<PaidSession> | null, param: string): asserts session is PaidSession {
  const isCents = (value: unknown) => Number.isSafeInteger(value) && (value as number) > 0
  const refuse = (field: string): never => {
    throw invalidRequest(`${param}[${field}] is missing or unsound.`, { param: `${param}[${field}]` })
  }
  if (typeof session !== 'object' || session === null)
    throw invalidRequest(`${param} is no object.`, { param })
  if (typeof session.id !== 'string' || !session.id.startsWith('cs_')) refuse('id')
  if (typeof session.paymentIntentId !== 'string' || !session.paymentIntentId.startsWith('pi_'))
    refuse('paymentIntentId')
  if (!isCents(session.amountTotalCents)) refuse('amountTotalCents')
  if (typeof session.currency !== 'string') refuse('currency')
  if (!isCents(session.created)) refuse('created')
  const refunds = session.refunds ?? []
  const unsound = refunds.some(refund => typeof refund.id !== 'string' || !isCents(refund.amountCents))
  const given = refunds.reduce((sum, refund) => sum + refund.amountCents, 0)
  if (unsound || given > session.amountTotalCents!) refuse('refunds')
  session.clientReferenceId ??= null
  session.customerEmail ??= null
  session.metadata ??= {}
}
