import { eq, isNull } from 'drizzle-orm'
import { paymentPutAside, paymentSession } from '../db/schema/payments.ts'
import type { Tx } from '../db/transaction.ts'

export function findSessionByIntent(tx: Tx, paymentIntentId: string) {
  return (
    tx.select().from(paymentSession).where(eq(paymentSession.paymentIntentId, paymentIntentId)).get() ?? null
  )
}

/** Payments that wait for the operator's decision. */
export function listPutAside(tx: Tx) {
  return tx.select().from(paymentPutAside).where(isNull(paymentPutAside.resolvedAt)).all()
}
