import type { OrderStatus, ReceiptView } from '#shared/orders/contract.ts'
import type { Db } from '../db/open.ts'
import { publicName } from '../stores/store-view.ts'
import { orderStatements } from './order-statements.ts'
import {
  findCustomer,
  findOrder,
  findOrderSetting,
  findSession,
  listCreditedSellers,
  listLines,
  listRecipients,
} from './queries.ts'

/** What the holder of a receipt address sees of the order, or null when there is none at it. */
export function findReceipt(db: Db, options: { receipt: string; publicUrl: string }): ReceiptView | null {
  const order = findOrder(db.orm, options.receipt)
  if (!order) return null
  const setting = findOrderSetting(db.orm, order.id)
  const lines = listLines(db.orm, order.id)
  const customer = findCustomer(db.orm, order.id)
  const session = order.status === 'awaiting_payment' ? findSession(db.orm, order.id) : null
  const labels = new Map(listRecipients(db.orm, order.id).map(recipient => [recipient.id, recipient.label]))
  const names = creditNames(db, lines, setting.organizationName)
  const locale = order.locale as 'en' | 'es'
  return {
    orderNumber: order.number,
    status: order.status as OrderStatus,
    placedAt: new Date(order.placedAt).toISOString(),
    paidAt: order.paidAt === null ? null : new Date(order.paidAt).toISOString(),
    payUrl: session?.url || null,
    payableUntil: session ? new Date(session.expiresAt).toISOString() : null,
    customerName: customer?.name ?? '',
    locale,
    lines: lines.map(line => ({
      itemCode: line.code,
      name: line.name,
      quantity: line.quantity,
      unitPriceCents: line.unitPriceCents,
      amountCents: line.amountCents,
      refundedQuantity: line.refundedQuantity,
      recipientLabel: labels.get(line.recipientId) ?? null,
      creditedTo: names.get(line.sellerId) ?? setting.organizationName,
      allergens: {
        contains: JSON.parse(line.contains),
        containsNone: line.containsNone,
        mayContain: JSON.parse(line.mayContain),
      },
      storage: line.storage,
      bestQualityMonths:
        line.bestQualityMin !== null && line.bestQualityMax !== null
          ? [line.bestQualityMin, line.bestQualityMax]
          : null,
    })),
    itemsCents: order.itemsCents,
    giftCents: order.giftCents,
    taxCents: order.taxCents,
    coverCents: order.coverCents,
    totalCents: order.totalCents,
    refundedCents: order.refundedCents,
    currency: order.currency,
    creditedTo: [...new Set(names.values())].join(', ') || setting.organizationName,
    handover: setting.sellerKind === 'student' ? 'seller_family' : 'school',
    organization: { name: setting.organizationName },
    drive: {
      timeZone: setting.timeZone,
      deliveryFrom: setting.deliveryFrom,
      deliveryTo: setting.deliveryTo,
      closesAt: new Date(setting.closedEarlyAt ?? setting.closesAt).toISOString(),
    },
    contact: { name: setting.contactName, email: setting.contactEmail },
    statements: orderStatements(lines, locale),
    storeUrl: setting.linkState === 'replaced' ? null : `${options.publicUrl}/s/${setting.linkToken}`,
  }
}

/** By seller, the public name that a customer is told the credit goes to. */
export function creditNames(
  db: Db,
  lines: { sellerId: number }[],
  organizationName: string,
): Map<number, string> {
  const sellers = listCreditedSellers(db.orm, [...new Set(lines.map(line => line.sellerId))])
  return new Map(
    sellers.map(seller => [seller.sellerId, publicName(seller) ?? seller.groupName ?? organizationName]),
  )
}
