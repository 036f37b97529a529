import { AppError } from '#shared/errors.ts'
import { PaymentServiceError, type SessionState, type StartPayment } from '../clients/payments.ts'
import { paymentSession } from '../db/schema/payments.ts'
import { inTransaction, type Tx } from '../db/transaction.ts'
import type { Deps } from '../deps.ts'
import { hit } from '../faults.ts'
import {
  findCustomer,
  findOrderSetting,
  findSession,
  listLines,
  listRecipients,
  type OrderRow,
} from './queries.ts'

/**
 * How long the payment page stays: the shortest the service allows is 30 minutes, counted by its own clock
 * from when the request reaches it, so a minute is added for the way there and the two clocks.
 */
export const PAYMENT_PAGE_MS = 31 * 60_000

/**
 * Opens the payment service's page for an order, or finds the one already opened. Safe to repeat: the order's
 * own key makes the service answer with the same page.
 *
 * @throws AppError payment_service_unreachable or in_progress; the order stays as it is.
 */
export async function startOrderPayment(
  deps: Deps,
  order: OrderRow,
): Promise<{ sessionId: string; url: string }> {
  const known = findSession(deps.db.orm, order.id)
  if (known) return known
  let session: SessionState
  try {
    session = await deps.payments.startPayment(toStartPayment(deps, order))
  } catch (error) {
    if (!(error instanceof PaymentServiceError)) throw error
    if (error.code === 'idempotency_key_in_use') throw new AppError('in_progress', { retryAfterSeconds: 1 })
    deps.log.warn({ order: order.number, kind: error.kind, code: error.code }, 'payment page not opened')
    throw new AppError('payment_service_unreachable', { retryAfterSeconds: 5 })
  }
  hit('F05')
  return inTransaction(deps.db, tx => rememberSession(tx, order.id, session, deps.now()))
}

/** Notes the page of an order; of two that note it, both get the first one's. */
export function rememberSession(tx: Tx, orderId: number, session: SessionState, now: number) {
  const known = findSession(tx, orderId)
  if (known) return known
  return tx
    .insert(paymentSession)
    .values({
      orderId,
      sessionId: session.sessionId,
      url: session.url ?? '',
      expiresAt: session.expiresAt,
      paymentIntentId: session.paymentIntentId,
      createdAt: now,
    })
    .returning()
    .get()
}

/** The request for an order's page: made from stored rows alone, so that it is the same at every try. */
export function toStartPayment(deps: Deps, order: OrderRow): StartPayment {
  const lines = listLines(deps.db.orm, order.id)
  const customer = findCustomer(deps.db.orm, order.id)
  const setting = findOrderSetting(deps.db.orm, order.id)
  const receipt = `${deps.config.publicUrl}/r/${order.publicId}`
  const extra = [
    { name: `Gift to ${setting.organizationName}`, unitCents: order.giftCents },
    { name: 'Sales tax', unitCents: order.taxCents },
    { name: 'Card fee, covered by you', unitCents: order.coverCents },
  ]
  return {
    orderPublicId: order.publicId,
    lines: [
      ...lines.map(line => ({ name: line.name, unitCents: line.unitPriceCents, quantity: line.quantity })),
      ...extra.filter(line => line.unitCents > 0).map(line => ({ ...line, quantity: 1 })),
    ],
    customerEmail: customer?.email ?? '',
    locale: order.locale as 'en' | 'es',
    successUrl: receipt,
    cancelUrl: `${deps.config.publicUrl}/s/${setting.linkToken}?canceled=${order.publicId}`,
    expiresAt: order.placedAt + PAYMENT_PAGE_MS,
    metadata: toMetadata(deps, order, lines, customer),
  }
}

/** The service takes 500 characters a value. */
const MAX_VALUE = 480

function toMetadata(
  deps: Deps,
  order: OrderRow,
  lines: ReturnType<typeof listLines>,
  customer: ReturnType<typeof findCustomer>,
): Record<string, string> {
  const recipients = listRecipients(deps.db.orm, order.id)
  const place = new Map(recipients.map((recipient, index) => [recipient.id, index]))
  const labels = JSON.stringify(recipients.map(recipient => recipient.label))
  return {
    order: order.publicId,
    number: order.number,
    link: String(order.linkId),
    terms: String(order.termsId),
    key: order.idempotencyKey,
    hash: order.requestHash,
    placedAt: String(order.placedAt),
    gift: String(order.giftCents),
    cover: String(order.coverCents),
    name: customer?.name ?? '',
    relationship: customer?.relationship ?? '',
    locale: order.locale,
    ...inPieces(
      'lines',
      lines.map(line => `${line.code}x${line.quantity}@${place.get(line.recipientId)}`).join(' '),
    ),
    ...inPieces('for', labels),
  }
}

function inPieces(name: string, text: string): Record<string, string> {
  const pieces: Record<string, string> = {}
  const characters = [...text]
  for (let at = 0, n = 0; at < characters.length; at += MAX_VALUE, n++)
    pieces[`${name}${n}`] = characters.slice(at, at + MAX_VALUE).join('')
  return pieces
}
