import type { SessionState } from '../clients/payments.ts'
import { inTransaction } from '../db/transaction.ts'
import type { Deps } from '../deps.ts'
import { expireOrder } from './expire-order.ts'
import { findOrder } from './queries.ts'
import { putAside, type Settled, settlePayment } from './settle-payment.ts'
import { rememberSession } from './start-payment.ts'

export type Applied = Settled | 'expired' | 'waiting' | 'unknown_order'

/**
 * Brings an order to the state the payment service tells of its page. Whoever learns of that state first, the
 * webhook, the returning customer or the reconciler, comes through here; the others find nothing left to do.
 */
export function applySession(deps: Deps, session: SessionState): Applied {
  return inTransaction(deps.db, tx => {
    const now = deps.now()
    const order = session.orderPublicId ? findOrder(tx, session.orderPublicId) : null
    if (!order) {
      if (session.paid) putAside(tx, deps, { session, orderId: null, driveId: null, reason: 'unknown_order' })
      return 'unknown_order'
    }
    rememberSession(tx, order.id, session, now)
    if (session.status === 'complete' && session.paid) return settlePayment(tx, deps, order, session)
    if (session.status === 'expired') return expireOrder(tx, order, now)
    return 'waiting'
  })
}
