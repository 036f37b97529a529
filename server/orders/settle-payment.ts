import { and, eq, inArray } from 'drizzle-orm'
import { localDay } from '#shared/deadline/wall-time.ts'
import { logActivity } from '../activity/log-activity.ts'
import type { SessionState } from '../clients/payments.ts'
import { order } from '../db/schema/orders.ts'
import { paymentPutAside, paymentSession } from '../db/schema/payments.ts'
import type { Tx } from '../db/transaction.ts'
import type { Deps } from '../deps.ts'
import { hit } from '../faults.ts'
import { newPublicId } from '../ids.ts'
import { postJournal } from '../ledger/post-journal.ts'
import { queueLetter } from '../mail/queue-letter.ts'
import { listGuardians, listStaff } from '../people/queries.ts'
import { creditLines } from './credit-lines.ts'
import { findCustomer, findOrderSetting, listLines, type OrderRow } from './queries.ts'
import { sellerMarks } from './tallies.ts'

export type Settled = 'paid' | 'already_paid' | 'put_aside'

/**
 * An order's payment has come: its status, the sellers' credit, the ledger and the letters, all or nothing.
 *
 * A payment whose amount or currency is not the order's is never credited; it is put aside for the operator.
 * Runs inside the caller's transaction. Of any number of callers exactly one credits.
 */
export function settlePayment(tx: Tx, deps: Deps, row: OrderRow, session: SessionState): Settled {
  const now = deps.now()
  if (session.amountTotalCents !== row.totalCents || session.currency !== row.currency) {
    putAside(tx, deps, {
      session,
      orderId: row.id,
      driveId: row.driveId,
      reason: session.currency !== row.currency ? 'wrong_currency' : 'wrong_amount',
    })
    return 'put_aside'
  }
  const { changes } = tx
    .update(order)
    .set({ status: 'paid', paidAt: now, endedAt: null })
    .where(and(eq(order.id, row.id), inArray(order.status, ['awaiting_payment', 'expired', 'canceled'])))
    .run()
  if (changes !== 1) return 'already_paid'
  tx.update(paymentSession)
    .set({ paymentIntentId: session.paymentIntentId })
    .where(eq(paymentSession.orderId, row.id))
    .run()

  postJournal(tx, {
    driveId: row.driveId,
    kind: 'order_paid',
    subject: row.publicId,
    at: now,
    entries: [
      { debit: 'cash_operator', credit: 'sales', amountCents: row.itemsCents },
      { debit: 'cash_operator', credit: 'gifts', amountCents: row.giftCents },
      { debit: 'cash_operator', credit: 'tax', amountCents: row.taxCents },
      { debit: 'cash_operator', credit: 'cover', amountCents: row.coverCents },
      { debit: 'card_fees', credit: 'cash_operator', amountCents: row.feeCents },
    ],
  })
  hit('F12')
  const setting = findOrderSetting(tx, row.id)
  const lines = listLines(tx, row.id)
  creditLines(tx, { order: row, lines, day: localDay(row.placedAt, setting.timeZone) })
  logActivity(tx, {
    at: now,
    driveId: row.driveId,
    actor: 'payment_service',
    action: 'order_paid',
    subject: `order:${row.publicId}`,
    before: { status: row.status },
    after: { status: 'paid', totalCents: row.totalCents },
  })
  hit('F13')
  queueLetters(tx, row, lines, now)
  return 'paid'
}

function queueLetters(tx: Tx, row: OrderRow, lines: ReturnType<typeof listLines>, now: number) {
  const customer = findCustomer(tx, row.id)
  if (customer)
    queueLetter(tx, {
      kind: 'receipt',
      subject: `order:${row.publicId}`,
      to: { name: customer.name, email: customer.email },
      locale: row.locale as 'en' | 'es',
      at: now,
    })
  for (const sellerId of new Set(lines.map(line => line.sellerId)))
    for (const guardian of listGuardians(tx, sellerId))
      queueLetter(tx, {
        kind: 'guardian_notice',
        subject: `order:${row.publicId}:seller:${sellerId}`,
        to: { name: guardian.name, email: guardian.email },
        locale: 'en',
        facts: { orderPublicId: row.publicId, sellerId, tallyNow: sellerMarks(tx, sellerId) },
        at: now,
      })
}

type PuttingAside = {
  session: SessionState
  orderId: number | null
  driveId: number | null
  reason: 'wrong_amount' | 'wrong_currency' | 'unknown_order'
}

/** Keeps a payment that cannot be credited, once, and tells the operator's admins. */
export function putAside(tx: Tx, deps: Deps, aside: PuttingAside) {
  const now = deps.now()
  const publicId = newPublicId()
  const { changes } = tx
    .insert(paymentPutAside)
    .values({
      publicId,
      sessionId: aside.session.sessionId,
      orderId: aside.orderId,
      reason: aside.reason,
      amountCents: aside.session.amountTotalCents,
      currency: aside.session.currency,
      createdAt: now,
    })
    .onConflictDoNothing()
    .run()
  if (changes !== 1) return
  logActivity(tx, {
    at: now,
    driveId: aside.driveId,
    actor: 'payment_service',
    action: 'payment_put_aside',
    subject: `payment:${publicId}`,
    after: {
      reason: aside.reason,
      amountCents: aside.session.amountTotalCents,
      currency: aside.session.currency,
    },
  })
  for (const admin of listStaff(tx, 'admin'))
    queueLetter(tx, {
      kind: 'staff_notice',
      subject: `payment:${publicId}`,
      to: { name: admin.name, email: admin.email },
      locale: 'en',
      facts: {
        notice: 'payment_put_aside',
        reason: aside.reason,
        amountCents: aside.session.amountTotalCents,
        currency: aside.session.currency,
      },
      at: now,
    })
}
