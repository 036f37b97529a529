import { asc, eq } from 'drizzle-orm'
import { order, orderLine } from '../db/schema/orders.ts'
import { refund, refundLine } from '../db/schema/payments.ts'
import type { Tx } from '../db/transaction.ts'

export type RefundRow = typeof refund.$inferSelect

/** A refund with its order and its lines by name. */
export function refundById(tx: Tx, publicId: string) {
  const found = tx
    .select({ refund, orderPublicId: order.publicId })
    .from(refund)
    .innerJoin(order, eq(order.id, refund.orderId))
    .where(eq(refund.publicId, publicId))
    .get()
  if (!found) throw new Error(`refund ${publicId} is gone`)
  return { ...found.refund, orderPublicId: found.orderPublicId, lines: listRefundLines(tx, found.refund.id) }
}

export function listRefundLines(tx: Tx, refundId: number) {
  return tx
    .select({
      orderLineId: refundLine.orderLineId,
      name: orderLine.name,
      code: orderLine.code,
      sellerId: orderLine.sellerId,
      tallyMarks: orderLine.tallyMarks,
      quantity: refundLine.quantity,
      amountCents: refundLine.amountCents,
      taxCents: refundLine.taxCents,
    })
    .from(refundLine)
    .innerJoin(orderLine, eq(orderLine.id, refundLine.orderLineId))
    .where(eq(refundLine.refundId, refundId))
    .orderBy(asc(orderLine.position))
    .all()
}

/** Refunds that were decided and of which the payment service's answer is not noted yet. */
export function listOpenRefunds(tx: Tx) {
  return tx
    .select()
    .from(refund)
    .where(eq(refund.state, 'requested'))
    .orderBy(asc(refund.requestedAt))
    .limit(200)
    .all()
}

export function listRefundsOfOrder(tx: Tx, orderId: number) {
  return tx.select().from(refund).where(eq(refund.orderId, orderId)).orderBy(asc(refund.requestedAt)).all()
}
