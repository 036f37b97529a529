import { and, asc, eq, like } from 'drizzle-orm'
import type { OrderPageView } from '#shared/drives/orders-contract.ts'
import { AppError } from '#shared/errors.ts'
import { refundAmount } from '#shared/fees/refund.ts'
import type { Relationship } from '#shared/orders/contract.ts'
import { activity } from '../db/schema/activity.ts'
import { user } from '../db/schema/identity.ts'
import { outbox } from '../db/schema/mail.ts'
import { order, orderFlag } from '../db/schema/orders.ts'
import { sellerPerson } from '../db/schema/sellers.ts'
import type { Tx } from '../db/transaction.ts'
import type { Deps } from '../deps.ts'
import {
  findCustomer,
  findOrderSetting,
  listCreditedSellers,
  listLines,
  type OrderRow,
} from '../orders/queries.ts'
import { findReceipt } from '../orders/receipt-view.ts'
import { toRefundable } from '../orders/refund-order.ts'
import { listRefundLines, listRefundsOfOrder } from '../orders/refund-queries.ts'

/** An order of this drive; of another's, or unknown, there is nothing. */
export function getOrderOfDrive(tx: Tx, driveId: number, orderPublicId: string): OrderRow {
  const row = tx
    .select()
    .from(order)
    .where(and(eq(order.driveId, driveId), eq(order.publicId, orderPublicId)))
    .get()
  if (!row) throw new AppError('not_found')
  return row
}

/** Everything about an order that its organizer may see, with who did what to it. */
export function toOrderPage(
  deps: Deps,
  of: { driveId: number; orderPublicId: string; mayRefund: boolean; mayMove: boolean },
): OrderPageView {
  const { orm } = deps.db
  const row = getOrderOfDrive(orm, of.driveId, of.orderPublicId)
  const receipt = findReceipt(deps.db, { receipt: row.publicId, publicUrl: deps.config.publicUrl })!
  const lines = listLines(orm, row.id)
  const customer = findCustomer(orm, row.id)
  const isPaid = row.status === 'paid' || row.status === 'partly_refunded'
  const left = isPaid
    ? refundAmount({
        order: toRefundable(row, lines),
        wanted: lines
          .filter(line => line.refundedQuantity < line.quantity)
          .map(line => ({ lineId: line.id, quantity: line.quantity - line.refundedQuantity })),
        everything: true,
      })
    : null
  return {
    id: row.publicId,
    number: row.number,
    status: receipt.status,
    placedAt: receipt.placedAt,
    paidAt: receipt.paidAt,
    timeZone: findOrderSetting(orm, row.id).timeZone,
    customer: {
      name: customer?.name ?? '',
      email: customer?.email ?? '',
      relationship: (customer?.relationship ?? 'other') as Relationship,
    },
    sellers: listCreditedSellers(orm, [...new Set(lines.map(line => line.sellerId))]).map(seller => ({
      number: seller.number,
      name: seller.firstName
        ? `${seller.firstName} ${seller.lastName}`
        : (seller.groupName ?? receipt.organization.name),
      group: seller.groupName,
    })),
    lines: receipt.lines.map((line, place) => ({ ...line, lineId: lines[place]!.id })),
    itemsCents: row.itemsCents,
    giftCents: row.giftCents,
    taxCents: row.taxCents,
    coverCents: row.coverCents,
    totalCents: row.totalCents,
    refundedCents: row.refundedCents,
    refundableCents: left?.ok ? left.amountCents : null,
    refunds: listRefundsOfOrder(orm, row.id).map(refund => ({
      amountCents: refund.amountCents,
      state: refund.state,
      reason: refund.reason,
      at: new Date(refund.requestedAt).toISOString(),
      lines: listRefundLines(orm, refund.id).map(line => `${line.quantity} × ${line.name}`),
    })),
    flags: listFlags(orm, row.id),
    letters: listLetters(orm, row.publicId),
    history: listHistory(orm, row.publicId),
    mayRefund: of.mayRefund && isPaid,
    mayMove: of.mayMove && isPaid,
  }
}

function listFlags(tx: Tx, orderId: number) {
  return tx
    .select({ flag: orderFlag, firstName: sellerPerson.firstName, lastName: sellerPerson.lastName })
    .from(orderFlag)
    .innerJoin(sellerPerson, eq(sellerPerson.sellerId, orderFlag.sellerId))
    .where(eq(orderFlag.orderId, orderId))
    .orderBy(asc(orderFlag.raisedAt))
    .all()
    .map(row => ({
      id: row.flag.publicId,
      seller: `${row.firstName} ${row.lastName}`,
      note: row.flag.note,
      at: new Date(row.flag.raisedAt).toISOString(),
      resolution: row.flag.resolution,
    }))
}

function listLetters(tx: Tx, orderPublicId: string) {
  return tx
    .select()
    .from(outbox)
    .where(and(like(outbox.subject, `order:${orderPublicId}%`)))
    .orderBy(asc(outbox.createdAt))
    .limit(50)
    .all()
    .map(letter => ({
      kind: letter.kind,
      to: letter.kind === 'receipt' ? letter.recipientEmail : letter.recipientName,
      state: letter.state,
      at: new Date(letter.sentAt ?? letter.createdAt).toISOString(),
    }))
}

function listHistory(tx: Tx, orderPublicId: string) {
  return tx
    .select({ entry: activity, name: user.name })
    .from(activity)
    .leftJoin(user, eq(user.id, activity.actor))
    .where(eq(activity.subject, `order:${orderPublicId}`))
    .orderBy(asc(activity.at), asc(activity.id))
    .limit(200)
    .all()
    .map(({ entry, name }) => ({
      at: new Date(entry.at).toISOString(),
      who: name ?? entry.actor,
      action: entry.action,
      reason: entry.reason,
      detail: entry.after,
    }))
}
