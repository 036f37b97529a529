import type Stripe from 'stripe'
import { invalidRequest, notFound } from './api-error.ts'
import { type Fake, seconds } from './fake.ts'
import { newSessionId, randomText } from './ids.ts'
import type { Params } from './params.ts'
import { type LineRequest, newLineItem, newSession } from './session-object.ts'

/** How long a page may stay open, in seconds: the payment service's own bounds and default. */
const SHORTEST = 30 * 60
const LONGEST = 24 * 60 * 60
/** The smallest card charge in US dollars, in cents. */
const SMALLEST_USD_CENTS = 50
const LARGEST_CENTS = 99_999_999
const CURRENCIES = new Set(Intl.supportedValuesOf('currency').map(code => code.toLowerCase()))

/** Checks a request for a new page, and answers with the deed that makes it. */
export function prepareSession(fake: Fake, params: Params): () => Stripe.Checkout.Session {
  const mode = params.requiredText('mode')
  if (mode !== 'payment')
    throw invalidRequest(`This stand-in takes mode payment only, not ${mode}.`, { param: 'mode' })
  const lines = readLines(params)
  const currency = lines[0]!.currency
  const amountTotalCents = lines.reduce((sum, line) => sum + line.unitCents * line.quantity, 0)
  refuseBadTotal(amountTotalCents, currency)

  const successUrl = params.url('success_url')
  if (successUrl === null)
    throw invalidRequest('Missing required param: success_url.', {
      code: 'parameter_missing',
      param: 'success_url',
    })
  const cancelUrl = params.url('cancel_url')
  const clientReferenceId = params.text('client_reference_id', { max: 200 })
  const customerEmail = readEmail(params)
  const locale = params.text('locale', { max: 10 })
  const metadata = params.metadata('metadata')
  const intentMetadata = params.within('payment_intent_data').metadata('metadata')
  const adaptivePricing = params.within('adaptive_pricing').flag('enabled') ?? false
  params.oneOf('ui_mode', ['hosted_page'])
  params.oneOf('submit_type', ['auto', 'pay'])
  const methods = params.list('allowed_payment_method_types')
  if (methods.some(method => method !== 'card'))
    throw invalidRequest('This stand-in takes cards only.', { param: 'allowed_payment_method_types[0]' })
  const created = seconds(fake)
  const expiresAt = readExpiry(params, created)

  return () => {
    const id = newSessionId()
    const session = newSession({
      id,
      url: `${fake.publicUrl}/pay/${id}`,
      created,
      expiresAt,
      amountTotalCents,
      currency,
      clientReferenceId,
      customerEmail,
      locale,
      metadata,
      successUrl,
      cancelUrl,
      adaptivePricing,
    })
    fake.books.save(session, {
      lines: lines.map(line => newLineItem(`li_${randomText(24)}`, line)),
      intentMetadata,
    })
    return session
  }
}

/** A session as it stands now: one whose time is up is expired by being looked at, if nothing did it before. */
export function getSession(fake: Fake, id: string): Stripe.Checkout.Session {
  const session = fake.books.find('checkout.session', id)
  if (!session) throw notFound('checkout.session', id)
  return session.status === 'open' && session.expires_at <= seconds(fake)
    ? markExpired(fake, session)
    : session
}

export function expireSession(fake: Fake, id: string): Stripe.Checkout.Session {
  return fake.books.transaction(() => {
    const session = getSession(fake, id)
    if (session.status !== 'open')
      throw invalidRequest(
        `Only Checkout Sessions with a status in ["open"] can be expired. This Checkout Session has a status of ${session.status}.`,
      )
    return markExpired(fake, session)
  })
}

/** Expires every open session whose time is up. */
export function expireOverdue(fake: Fake): void {
  fake.books.transaction(() => {
    for (const id of fake.books.overdueSessions(seconds(fake))) getSession(fake, id)
  })
}

function markExpired(fake: Fake, session: Stripe.Checkout.Session): Stripe.Checkout.Session {
  const expired = { ...session, status: 'expired' as const, url: null }
  fake.books.transaction(() => {
    fake.books.save(expired)
    fake.announce('checkout.session.expired', expired)
  })
  return expired
}

function readLines(params: Params): LineRequest[] {
  const lines = params.items('line_items').map(item => {
    if (item.has('price'))
      throw invalidRequest(`No such price: '${item.text('price')}'`, {
        code: 'resource_missing',
        param: item.nameOf('price'),
      })
    const price = item.within('price_data')
    const product = price.within('product_data')
    const currency = price.requiredText('currency').toLowerCase()
    if (!CURRENCIES.has(currency))
      throw invalidRequest(`Invalid currency: ${currency}.`, { param: price.nameOf('currency') })
    const name = product.requiredText('name', { max: 250 })
    product.text('description')
    product.metadata('metadata')
    const unitCents = price.integer('unit_amount', { min: 0, max: LARGEST_CENTS })
    if (unitCents === null)
      throw invalidRequest(`Missing required param: ${price.nameOf('unit_amount')}.`, {
        code: 'parameter_missing',
        param: price.nameOf('unit_amount'),
      })
    return { name, currency, unitCents, quantity: item.integer('quantity', { min: 1, max: 999_999 }) ?? 1 }
  })
  if (lines.length === 0)
    throw invalidRequest('Missing required param: line_items.', {
      code: 'parameter_missing',
      param: 'line_items',
    })
  if (lines.length > 100)
    throw invalidRequest('A page can have at most 100 line items.', { param: 'line_items' })
  if (new Set(lines.map(line => line.currency)).size > 1)
    throw invalidRequest('All prices of a page must use the same currency.', { param: 'line_items' })
  return lines
}

function refuseBadTotal(cents: number, currency: string): void {
  if (currency === 'usd' && cents < SMALLEST_USD_CENTS)
    throw invalidRequest("The Checkout Session's total amount due must add up to at least $0.50 usd", {
      code: 'amount_too_small',
    })
  if (cents > LARGEST_CENTS)
    throw invalidRequest("The Checkout Session's total amount must be no more than 999,999.99", {
      code: 'amount_too_large',
    })
}

function readEmail(params: Params): string | null {
  const email = params.text('customer_email', { max: 800 })
  if (email !== null && !/^[^\s@]+@[^\s@]+\.[^\s@]+$/.test(email))
    throw invalidRequest(`Invalid email address: ${email}`, {
      code: 'email_invalid',
      param: 'customer_email',
    })
  return email
}

function readExpiry(params: Params, created: number): number {
  const expiresAt = params.integer('expires_at') ?? created + LONGEST
  if (expiresAt - created < SHORTEST)
    throw invalidRequest(
      'The `expires_at` timestamp must be at least 30 minutes from Checkout Session creation.',
      {
        param: 'expires_at',
      },
    )
  if (expiresAt - created > LONGEST)
    throw invalidRequest(
      'The `expires_at` timestamp must be less than 24 hours from Checkout Session creation.',
      {
        param: 'expires_at',
      },
    )
  return expiresAt
}
