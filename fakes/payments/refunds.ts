import type Stripe from 'stripe'
import { invalidRequest, notFound } from './api-error.ts'
import { type Fake, seconds } from './fake.ts'
import { newRefundId } from './ids.ts'
import { newRefund } from './money-objects.ts'
import type { Params } from './params.ts'

const REASONS = ['duplicate', 'fraudulent', 'requested_by_customer']

/** Checks a request for a refund, and answers with the deed that gives the money back. */
export function prepareRefund(fake: Fake, params: Params): () => Stripe.Refund {
  const intentId = params.text('payment_intent')
  const chargeId = params.text('charge')
  if (intentId === null && chargeId === null)
    throw invalidRequest(
      'One of the following params should be provided for this request: payment_intent or charge.',
      {
        code: 'parameter_missing',
      },
    )
  const asked = params.integer('amount', { min: 1 })
  const reason = params.oneOf('reason', REASONS)
  const metadata = params.metadata('metadata')

  return () => {
    const charge = intentId === null ? getCharge(fake, chargeId!) : chargeOfIntent(fake, intentId)
    const remaining = charge.amount - charge.amount_refunded
    if (remaining === 0)
      throw invalidRequest(`Charge ${charge.id} has already been refunded.`, {
        code: 'charge_already_refunded',
      })
    const amountCents = asked ?? remaining
    if (amountCents > remaining)
      throw invalidRequest(
        `Refund amount (${dollars(amountCents)}) is greater than unrefunded amount on charge (${dollars(remaining)})`,
        { code: 'amount_too_large', param: 'amount' },
      )
    const refund = newRefund({
      id: newRefundId(),
      created: seconds(fake),
      amountCents,
      currency: charge.currency,
      metadata,
      paymentIntentId: typeof charge.payment_intent === 'string' ? charge.payment_intent : null,
      chargeId: charge.id,
      reason,
    })
    const changed = withRefunded(charge, charge.amount_refunded + amountCents)
    fake.books.save(refund)
    fake.books.save(changed)
    fake.announce('refund.created', refund)
    fake.announce('charge.refunded', changed, {
      previous: { amount_refunded: charge.amount_refunded, refunded: charge.refunded },
    })
    fake.announce('refund.updated', refund)
    return refund
  }
}

export function getRefund(fake: Fake, id: string): Stripe.Refund {
  const refund = fake.books.find('refund', id)
  if (!refund) throw notFound('refund', id)
  return refund
}

/** The customer's bank sends a refund back later: the money is ours again, and the refund has failed. */
export function failRefund(fake: Fake, id: string): Stripe.Refund {
  return fake.books.transaction(() => {
    const refund = getRefund(fake, id)
    if (refund.status !== 'succeeded') throw invalidRequest(`This refund is ${refund.status}.`)
    const charge = getCharge(fake, String(refund.charge))
    const failed: Stripe.Refund = { ...refund, status: 'failed', failure_reason: 'expired_or_canceled_card' }
    fake.books.save(failed)
    fake.books.save(withRefunded(charge, charge.amount_refunded - refund.amount))
    fake.announce('refund.updated', failed, { previous: { status: refund.status } })
    fake.announce('refund.failed', failed)
    return failed
  })
}

export function withRefunded(charge: Stripe.Charge, amountRefunded: number): Stripe.Charge {
  return { ...charge, amount_refunded: amountRefunded, refunded: amountRefunded === charge.amount }
}

function getCharge(fake: Fake, id: string): Stripe.Charge {
  const charge = fake.books.find('charge', id)
  if (!charge) throw invalidRequest(`No such charge: '${id}'`, { code: 'resource_missing', param: 'charge' })
  return charge
}

function chargeOfIntent(fake: Fake, intentId: string): Stripe.Charge {
  const intent = fake.books.find('payment_intent', intentId)
  if (!intent)
    throw invalidRequest(`No such payment_intent: '${intentId}'`, {
      code: 'resource_missing',
      param: 'payment_intent',
    })
  if (typeof intent.latest_charge !== 'string')
    throw invalidRequest(`This PaymentIntent (${intentId}) does not have a successful charge to refund.`, {
      code: 'payment_intent_unexpected_state',
      param: 'payment_intent',
    })
  return getCharge(fake, intent.latest_charge)
}

function dollars(cents: number): string {
  return new Intl.NumberFormat('en-US', { style: 'currency', currency: 'USD' }).format(cents / 100)
}
