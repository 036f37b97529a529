import type Stripe from 'stripe'

export type SessionRequest = {
  id: string
  url: string
  created: number
  expiresAt: number
  amountTotalCents: number
  currency: string
  clientReferenceId: string | null
  customerEmail: string | null
  locale: string | null
  metadata: Record<string, string>
  successUrl: string
  cancelUrl: string | null
  adaptivePricing: boolean
}

/** An open page, with every field the payment service's own type requires. Instants in Unix seconds. */
export function newSession(request: SessionRequest): Stripe.Checkout.Session {
  return {
    id: request.id,
    object: 'checkout.session',
    adaptive_pricing: { enabled: request.adaptivePricing },
    after_expiration: null,
    allow_promotion_codes: null,
    allowed_payment_method_types: ['card'],
    amount_subtotal: request.amountTotalCents,
    amount_total: request.amountTotalCents,
    automatic_tax: { enabled: false, liability: null, provider: null, status: null },
    billing_address_collection: null,
    cancel_url: request.cancelUrl,
    client_reference_id: request.clientReferenceId,
    client_secret: null,
    collected_information: null,
    consent: null,
    consent_collection: null,
    created: request.created,
    currency: request.currency,
    currency_conversion: null,
    custom_fields: [],
    custom_text: {
      after_submit: null,
      shipping_address: null,
      submit: null,
      terms_of_service_acceptance: null,
    },
    customer: null,
    customer_account: null,
    customer_creation: 'if_required',
    customer_details: request.customerEmail === null ? null : detailsOf(request.customerEmail, null),
    customer_email: request.customerEmail,
    discounts: [],
    expires_at: request.expiresAt,
    integration_identifier: null,
    invoice: null,
    invoice_creation: null,
    livemode: false,
    locale: request.locale,
    managed_payments: null,
    metadata: request.metadata,
    mode: 'payment',
    origin_context: null,
    payment_intent: null,
    payment_link: null,
    payment_method_collection: 'if_required',
    payment_method_configuration_details: null,
    payment_method_options: {},
    payment_method_types: ['card'],
    payment_status: 'unpaid',
    permissions: null,
    recovered_from: null,
    saved_payment_method_options: null,
    setup_intent: null,
    shipping_address_collection: null,
    shipping_cost: null,
    shipping_options: [],
    status: 'open',
    submit_type: null,
    subscription: null,
    success_url: request.successUrl,
    total_details: { amount_discount: 0, amount_shipping: 0, amount_tax: 0 },
    ui_mode: 'hosted_page',
    url: request.url,
    wallet_options: null,
  }
}

/** Who paid, as the page's form and the shop said. */
export function detailsOf(
  email: string | null,
  name: string | null,
): Stripe.Checkout.Session.CustomerDetails {
  return {
    address: null,
    business_name: null,
    email,
    individual_name: name,
    name,
    phone: null,
    tax_exempt: 'none',
    tax_ids: [],
  }
}

export type LineRequest = { name: string; quantity: number; unitCents: number; currency: string }

export function newLineItem(id: string, line: LineRequest): Stripe.LineItem {
  const amount = line.unitCents * line.quantity
  return {
    id,
    object: 'item',
    adjustable_quantity: null,
    amount_discount: 0,
    amount_subtotal: amount,
    amount_tax: 0,
    amount_total: amount,
    currency: line.currency,
    description: line.name,
    metadata: {},
    price: null,
    quantity: line.quantity,
  }
}
