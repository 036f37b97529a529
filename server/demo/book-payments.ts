import { eq } from 'drizzle-orm'
import { order, orderCustomer } from '../db/schema/orders.ts'
import { paymentSession } from '../db/schema/payments.ts'
import type { Deps } from '../deps.ts'
import { listRefundsOfOrder } from '../orders/refund-queries.ts'

/** Writes the seeded payments into the stand-in's own book, so that a seeded order can be refunded. */
export async function bookPayments(deps: Deps) {
  if (!deps.config.stripe.apiBase) throw new Error('payments can be booked only with the stand-in')
  const rows = deps.db.orm
    .select({ order, session: paymentSession, email: orderCustomer.email })
    .from(order)
    .innerJoin(paymentSession, eq(paymentSession.orderId, order.id))
    .innerJoin(orderCustomer, eq(orderCustomer.orderId, order.id))
    .all()
  const sessions = rows.map(row => ({
    id: row.session.sessionId,
    paymentIntentId: row.session.paymentIntentId,
    amountTotalCents: row.order.totalCents,
    currency: row.order.currency,
    created: Math.floor(row.order.placedAt / 1000),
    clientReferenceId: row.order.publicId,
    metadata: { order: row.order.publicId },
    customerEmail: row.email,
    refunds: listRefundsOfOrder(deps.db.orm, row.order.id).map(refund => ({
      id: refund.providerRefundId,
      amountCents: refund.amountCents,
      created: Math.floor(refund.requestedAt / 1000),
      metadata: { refund: refund.publicId },
    })),
  }))
  const response = await fetch(new URL('/_test/import', deps.config.stripe.apiBase), {
    method: 'POST',
    headers: { 'Content-Type': 'application/json' },
    body: JSON.stringify({ sessions }),
  })
  if (!response.ok)
    throw new Error(`the payment stand-in did not take the seeded payments: ${await response.text()}`)
}
