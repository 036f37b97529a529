import type { Relationship } from '#shared/orders/contract.ts'
import { nextPrize } from '#shared/tally/tally.ts'
import type { Deps } from '../deps.ts'
import {
  findCustomer,
  findOrder,
  findOrderSetting,
  listLines,
  listRecipients,
  type OrderRow,
} from '../orders/queries.ts'
import { creditNames } from '../orders/receipt-view.ts'
import { refundById } from '../orders/refund-queries.ts'
import { getSeller } from '../sellers/queries.ts'

type MailLocale = 'en' | 'es'

/** What the receipt tells, from the order's own snapshots. */
export function receiptProps(deps: Deps, order: OrderRow) {
  const { orm } = deps.db
  const setting = findOrderSetting(orm, order.id)
  const lines = listLines(orm, order.id)
  const labels = new Map(listRecipients(orm, order.id).map(recipient => [recipient.id, recipient.label]))
  const names = creditNames(deps.db, lines, setting.organizationName)
  return {
    locale: order.locale as MailLocale,
    orderNumber: order.number,
    customerName: findCustomer(orm, order.id)?.name ?? '',
    creditedTo: [...new Set(names.values())].join(', ') || setting.organizationName,
    organizationName: setting.organizationName,
    organizationShareBp: setting.shareBp,
    lines: lines.map(line => ({
      itemCode: line.code,
      name: line.name,
      quantity: line.quantity,
      unitPriceCents: line.unitPriceCents,
      amountCents: line.amountCents,
      recipientLabel: labels.get(line.recipientId) ?? null,
      allergens: {
        contains: JSON.parse(line.contains) as string[],
        containsNone: line.containsNone,
        mayContain: JSON.parse(line.mayContain) as string[],
      },
      storage: line.storage,
      bestQualityMonths:
        line.bestQualityMin !== null && line.bestQualityMax !== null
          ? ([line.bestQualityMin, line.bestQualityMax] as [number, number])
          : null,
    })),
    itemsCents: order.itemsCents,
    giftCents: order.giftCents,
    taxCents: order.taxCents,
    coverCents: order.coverCents,
    totalCents: order.totalCents,
    currency: order.currency,
    paidAt: order.paidAt ?? order.placedAt,
    timeZone: setting.timeZone,
    deliveryFrom: setting.deliveryFrom,
    deliveryTo: setting.deliveryTo,
    handover: setting.sellerKind === 'student' ? ('seller_family' as const) : ('school' as const),
    organizationBearsCardFees: setting.organizationBearsCardFees,
    receiptUrl: `${deps.config.publicUrl}/r/${order.publicId}`,
    contact: { name: setting.contactName, email: setting.contactEmail },
  }
}

/** What a guardian is told of an order: the customer's name and the items, never the e-mail address. */
export function guardianNoticeProps(deps: Deps, facts: Record<string, unknown>, locale: MailLocale) {
  const { orm } = deps.db
  const order = findOrder(orm, String(facts.orderPublicId))
  if (!order) throw new Error('the order of this notice is gone')
  const sellerId = Number(facts.sellerId)
  const seller = getSeller(orm, sellerId)
  const customer = findCustomer(orm, order.id)
  const lines = listLines(orm, order.id).filter(line => line.sellerId === sellerId)
  const tallyNow = Number(facts.tallyNow)
  const page = `${deps.config.publicUrl}/family/sellers/${seller.publicId}`
  return {
    locale,
    sellerFullName: `${seller.firstName} ${seller.lastName}`,
    sellerFirstName: seller.firstName,
    customerName: customer?.name ?? '',
    relationship: (customer?.relationship ?? 'other') as Relationship,
    lines: lines.map(line => ({ name: line.name, quantity: line.quantity })),
    itemCount: lines.reduce((sum, line) => sum + line.quantity, 0),
    tallyNow,
    prizeEvery: seller.prizeEvery,
    itemsToNextPrize: nextPrize(tallyNow, seller.prizeEvery).toNext,
    orderUrl: `${page}#order-${order.publicId}`,
    unknownPersonUrl: `${page}#unknown-${order.publicId}`,
    organizationName: seller.organization,
    timeZone: seller.timeZone,
    placedAt: order.placedAt,
  }
}

/** What a customer is told of money that went back to their card. */
export function refundNoticeProps(deps: Deps, facts: Record<string, unknown>, locale: MailLocale) {
  const { orm } = deps.db
  const refund = refundById(orm, String(facts.refundPublicId))
  const order = findOrder(orm, refund.orderPublicId)!
  const setting = findOrderSetting(orm, order.id)
  return {
    locale,
    orderNumber: order.number,
    customerName: findCustomer(orm, order.id)?.name ?? '',
    refundedCents: refund.amountCents,
    currency: order.currency,
    lines: refund.lines,
    whole: order.status === 'refunded',
    remainingTotalCents: order.totalCents - order.refundedCents,
    receiptUrl: `${deps.config.publicUrl}/r/${order.publicId}`,
    contact: { name: setting.contactName, email: setting.contactEmail },
  }
}
