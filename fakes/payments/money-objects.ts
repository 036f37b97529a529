import type Stripe from 'stripe'
import type { Card } from './cards.ts'

type Common = {
  id: string
  created: number
  amountCents: number
  currency: string
  metadata: Record<string, string>
}

/** A payment that was begun and has not gone through yet. */
export function newPaymentIntent(request: Common & { receiptEmail: string | null }): Stripe.PaymentIntent {
  return {
    id: request.id,
    object: 'payment_intent',
    allowed_payment_method_types: ['card'],
    amount: request.amountCents,
    amount_capturable: 0,
    amount_received: 0,
    application: null,
    application_fee_amount: null,
    automatic_payment_methods: null,
    canceled_at: null,
    cancellation_reason: null,
    capture_method: 'automatic_async',
    client_secret: null,
    confirmation_method: 'automatic',
    created: request.created,
    currency: request.currency,
    customer: null,
    customer_account: null,
    description: null,
    excluded_payment_method_types: null,
    last_payment_error: null,
    latest_charge: null,
    livemode: false,
    managed_payments: null,
    metadata: request.metadata,
    next_action: null,
    on_behalf_of: null,
    payment_method: null,
    payment_method_configuration_details: null,
    payment_method_options: {},
    payment_method_types: ['card'],
    payment_record: null,
    processing: null,
    receipt_email: request.receiptEmail,
    review: null,
    setup_future_usage: null,
    shipping: null,
    source: null,
    statement_descriptor: null,
    statement_descriptor_suffix: null,
    status: 'requires_payment_method',
    transfer_group: null,
  }
}

type ChargeRequest = Common & {
  paymentIntentId: string
  card: Pick<Card, 'brand' | 'last4'>
  name: string | null
  email: string | null
}

/** Money taken from a card. Of the card it keeps the brand and the last four digits, never the number. */
export function newCharge(request: ChargeRequest): Stripe.Charge {
  return {
    id: request.id,
    object: 'charge',
    amount: request.amountCents,
    amount_captured: request.amountCents,
    amount_refunded: 0,
    application: null,
    application_fee: null,
    application_fee_amount: null,
    balance_transaction: null,
    billing_details: { address: null, email: request.email, name: request.name, phone: null, tax_id: null },
    calculated_statement_descriptor: null,
    captured: true,
    created: request.created,
    currency: request.currency,
    customer: null,
    description: null,
    disputed: false,
    failure_balance_transaction: null,
    failure_code: null,
    failure_message: null,
    fraud_details: {},
    livemode: false,
    metadata: request.metadata,
    on_behalf_of: null,
    outcome: {
      advice_code: null,
      network_advice_code: null,
      network_decline_code: null,
      network_status: 'approved_by_network',
      reason: null,
      risk_level: 'normal',
      seller_message: 'Payment complete.',
      type: 'authorized',
    },
    paid: true,
    payment_intent: request.paymentIntentId,
    payment_method: null,
    payment_method_details: {
      type: 'card',
      card: { brand: request.card.brand, last4: request.card.last4 },
    } as Stripe.Charge.PaymentMethodDetails,
    receipt_email: request.email,
    receipt_number: null,
    receipt_url: null,
    refunded: false,
    review: null,
    shipping: null,
    source: null,
    source_transfer: null,
    statement_descriptor: null,
    statement_descriptor_suffix: null,
    status: 'succeeded',
    transfer_data: null,
    transfer_group: null,
  }
}

type RefundRequest = Common & { paymentIntentId: string | null; chargeId: string; reason: string | null }

export function newRefund(request: RefundRequest): Stripe.Refund {
  return {
    id: request.id,
    object: 'refund',
    amount: request.amountCents,
    balance_transaction: null,
    charge: request.chargeId,
    created: request.created,
    currency: request.currency,
    customer: null,
    customer_account: null,
    metadata: request.metadata,
    payment_intent: request.paymentIntentId,
    payment_method: null,
    reason: request.reason,
    receipt_number: null,
    source_transfer_reversal: null,
    status: 'succeeded',
    transfer_reversal: null,
  }
}
