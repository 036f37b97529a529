import { PaymentServiceError } from '../clients/payments.ts'
import { inTransaction } from '../db/transaction.ts'
import type { Deps } from '../deps.ts'
import { applySession } from '../orders/apply-session.ts'
import { expireOrder } from '../orders/expire-order.ts'
import { findOrder, listWaiting } from '../orders/queries.ts'
import { toStartPayment } from '../orders/start-payment.ts'
import { processOpenEvents } from './receive-event.ts'

/** A waiting order this young is left to its customer and the webhook. */
const YOUNG_MS = 20_000
const PER_ROUND = 60
const AT_ONCE = 4

/**
 * Asks the payment service about orders that still wait, so that no order depends on a message that never
 * came: paid ones are settled, expired ones end, and one whose page was lost in a crash finds it again.
 */
export function makeReconciler(deps: Deps) {
  /** When each waiting order was last asked about; young ones often, old ones every minute. */
  const askedAt = new Map<number, number>()

  return {
    async round(options: { all?: boolean } = {}) {
      await processOpenEvents(deps, { olderThanMs: options.all ? 0 : 5_000 })
      const now = deps.now()
      const waiting = listWaiting(deps.db.orm, {
        before: options.all ? now + 1 : now - YOUNG_MS,
        limit: options.all ? 10_000 : 1_000,
      })
      const stillWaiting = new Set(waiting.map(row => row.id))
      for (const id of askedAt.keys()) if (!stillWaiting.has(id)) askedAt.delete(id)
      const due = waiting
        .filter(
          row =>
            options.all ||
            now - (askedAt.get(row.id) ?? 0) >= (now - row.placedAt < 300_000 ? 20_000 : 60_000),
        )
        .slice(0, options.all ? undefined : PER_ROUND)
      for (let at = 0; at < due.length; at += AT_ONCE)
        await Promise.all(
          due.slice(at, at + AT_ONCE).map(async row => {
            askedAt.set(row.id, now)
            await bringUpToDate(deps, row)
          }),
        )
    },
  }
}

async function bringUpToDate(deps: Deps, row: ReturnType<typeof listWaiting>[number]) {
  try {
    if (row.sessionId && row.replacedById !== null)
      applySession(deps, await deps.payments.expireSession(row.sessionId))
    else if (row.sessionId) applySession(deps, await deps.payments.getSession(row.sessionId))
    else await findLostPage(deps, row.publicId)
  } catch (error) {
    if (!(error instanceof PaymentServiceError)) throw error
    deps.log.warn({ kind: error.kind, code: error.code }, 'payment service not asked')
  }
}

/**
 * We stopped between asking for a page and noting it. The same key brings back the page that was made; when
 * the service refuses, none was, and none can be any more in the time the order had.
 */
async function findLostPage(deps: Deps, publicId: string) {
  const order = findOrder(deps.db.orm, publicId)
  if (order?.status !== 'awaiting_payment') return
  try {
    applySession(deps, await deps.payments.startPayment(toStartPayment(deps, order)))
  } catch (error) {
    if (!(error instanceof PaymentServiceError) || error.kind !== 'refused') throw error
    if (error.code === 'idempotency_key_in_use') return
    const made = await findPageInBook(deps, order.publicId, order.placedAt)
    if (made) applySession(deps, made)
    else inTransaction(deps.db, tx => void expireOrder(tx, order, deps.now()))
  }
}

/** The service forgets keys after a day, but never its pages: look through its book from the order's moment on. */
async function findPageInBook(deps: Deps, publicId: string, placedAt: number) {
  for await (const session of deps.payments.listSessionsSince(placedAt - 60_000))
    if (session.orderPublicId === publicId) return session
  return null
}
