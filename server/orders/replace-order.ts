import { and, eq } from 'drizzle-orm'
import { PaymentServiceError } from '../clients/payments.ts'
import { order } from '../db/schema/orders.ts'
import { inTransaction } from '../db/transaction.ts'
import type { Deps } from '../deps.ts'
import { applySession } from './apply-session.ts'
import { findOrder, findSession, type OrderRow } from './queries.ts'

/**
 * Lets a changed order take the place of the one from the same pad that was not paid: the old payment page
 * is ended, so that the same pad cannot be paid twice. When the service does not answer, the old page ends by
 * itself within its half hour.
 */
export async function replaceOrder(deps: Deps, options: { old: string; by: OrderRow }) {
  const old = findOrder(deps.db.orm, options.old)
  if (
    !old ||
    old.linkId !== options.by.linkId ||
    old.id === options.by.id ||
    old.status !== 'awaiting_payment'
  )
    return
  inTransaction(deps.db, tx => {
    tx.update(order)
      .set({ replacedById: options.by.id })
      .where(and(eq(order.id, old.id), eq(order.status, 'awaiting_payment')))
      .run()
  })
  const session = findSession(deps.db.orm, old.id)
  if (!session) return
  try {
    applySession(deps, await deps.payments.expireSession(session.sessionId))
  } catch (error) {
    if (!(error instanceof PaymentServiceError)) throw error
    deps.log.warn({ order: old.number }, 'the replaced payment page could not be ended yet')
  }
}
