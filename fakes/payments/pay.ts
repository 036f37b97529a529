import type Stripe from 'stripe'
import { ApiError, invalidRequest } from './api-error.ts'
import type { Card } from './cards.ts'
import { type Fake, seconds } from './fake.ts'
import { newChargeId, newPaymentIntentId } from './ids.ts'
import { newCharge, newPaymentIntent } from './money-objects.ts'
import { detailsOf } from './session-object.ts'
import { getSession } from './sessions.ts'

const DECLINED: Record<string, string> = {
  declined: 'Your card was declined.',
  insufficient_funds: 'Your card has insufficient funds.',
  expired_card: 'Your card has expired.',
  incorrect_cvc: "Your card's security code is incorrect.",
  processing_error: 'An error occurred while processing your card. Try again in a little bit.',
  not_a_number: 'Your card number is incorrect.',
  not_a_test_card: 'Your card was declined. Your request was in test mode, but used a non test card.',
}

/**
 * Pays an open session with a card.
 *
 * @throws ApiError 402 when the card is declined, and the session stays open; 400 when it is open no more.
 */
export function paySession(fake: Fake, payment: { sessionId: string; card: Card; name: string | null }) {
  const outcome = fake.books.transaction(() => {
    const session = getSession(fake, payment.sessionId)
    if (session.status !== 'open') return refusalOf(session)
    const intent = intentOf(fake, session)
    if (payment.card.decline) return decline(fake, { session, intent, card: payment.card })
    return take(fake, { session, intent, card: payment.card, name: payment.name })
  })
  if (outcome instanceof ApiError) throw outcome
  return outcome
}

function refusalOf(session: Stripe.Checkout.Session): ApiError {
  return session.status === 'complete'
    ? invalidRequest('This Checkout Session has already been paid.', { code: 'checkout_session_complete' })
    : invalidRequest('This Checkout Session has expired.', { code: 'checkout_session_expired' })
}

/** The payment comes into being at the first try, as with the service itself; later tries go on with it. */
function intentOf(fake: Fake, session: Stripe.Checkout.Session): Stripe.PaymentIntent {
  const existing = typeof session.payment_intent === 'string' ? session.payment_intent : null
  if (existing) return fake.books.find('payment_intent', existing)!
  return newPaymentIntent({
    id: newPaymentIntentId(),
    created: seconds(fake),
    amountCents: session.amount_total ?? 0,
    currency: session.currency ?? 'usd',
    metadata: fake.books.asideOf(session.id).intentMetadata,
    receiptEmail: null,
  })
}

type Attempt = { session: Stripe.Checkout.Session; intent: Stripe.PaymentIntent; card: Card }

function decline(fake: Fake, { session, intent, card }: Attempt): ApiError {
  const { code, declineCode, reason } = card.decline!
  const message = DECLINED[reason]!
  fake.books.save({
    ...intent,
    last_payment_error: { type: 'card_error', code, decline_code: declineCode, message },
  } as Stripe.PaymentIntent)
  fake.books.save({ ...session, payment_intent: intent.id })
  const param = reason === 'not_a_number' ? 'number' : reason === 'incorrect_cvc' ? 'cvc' : undefined
  return new ApiError(402, {
    type: 'card_error',
    code,
    decline_code: declineCode,
    message,
    payment_intent: intent.id,
    ...(param && { param }),
  })
}

function take(
  fake: Fake,
  { session, intent, card, name }: Attempt & { name: string | null },
): Stripe.Checkout.Session {
  const { wrongAmountNext, wrongCurrencyNext } = fake.behaviour.current
  fake.behaviour.change({ wrongAmountNext: 0, wrongCurrencyNext: '' })
  const amount = (session.amount_total ?? 0) + wrongAmountNext
  const currency = wrongCurrencyNext || (session.currency ?? 'usd')
  const charge = newCharge({
    id: newChargeId(),
    created: seconds(fake),
    amountCents: amount,
    currency,
    metadata: intent.metadata,
    paymentIntentId: intent.id,
    card,
    name,
    email: session.customer_email,
  })
  const paid: Stripe.Checkout.Session = {
    ...session,
    amount_total: amount,
    amount_subtotal: amount,
    currency,
    status: 'complete',
    payment_status: 'paid',
    payment_intent: intent.id,
    url: null,
    customer_details: detailsOf(session.customer_email, name),
  }
  fake.books.save(charge)
  fake.books.save({
    ...intent,
    amount,
    amount_received: amount,
    currency,
    status: 'succeeded',
    latest_charge: charge.id,
    last_payment_error: null,
  })
  fake.books.save(paid)
  fake.announce('checkout.session.completed', paid)
  return paid
}
