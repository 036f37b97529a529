import { formatDay, formatDays } from '#shared/deadline/formatting.ts'
import { formatAmount, formatMoney } from '#shared/money.ts'
import { foodFacts } from './food-facts.ts'
import { fullDay, percentOf } from './parts/formats.ts'
import { subjectLine } from './parts/literal.ts'
import { wordsFor } from './parts/words.ts'
import type { ReceiptMail } from './receipt.tsx'

export type ReceiptFacts = ReturnType<typeof receiptFacts>

/** What the receipt says, worked out once for its HTML and its text. */
export function receiptFacts(mail: ReceiptMail) {
  const words = wordsFor(mail.locale)
  const { t, locale } = words
  const organization = mail.organizationName
  const money = (cents: number) => formatMoney(cents, { locale, currency: mail.currency })
  const count = mail.lines.reduce((sum, line) => sum + line.quantity, 0)
  const total = money(mail.totalCents)
  const days = formatDays(mail.deliveryFrom, mail.deliveryTo, locale)
  const credit =
    mail.creditedTo === organization
      ? t('receipt.creditOrganization', { organization })
      : t('receipt.creditSeller', { credit: mail.creditedTo, organization })
  const paid = t('receipt.intro', { credit: mail.creditedTo, count })
  const gift =
    mail.giftCents > 0 ? t('receipt.introAndGift', { gift: money(mail.giftCents), organization }) : ''
  return {
    words,
    money,
    /** For the column of amounts, which says once what it holds. */
    amount: (cents: number) => formatAmount(cents, locale),
    count,
    /** False for a gift alone: then nothing arrives and nothing is stored. */
    hasFood: mail.lines.length > 0,
    subject: subjectLine(
      count > 0
        ? t('receipt.subject', { number: mail.orderNumber, credit })
        : t('receipt.subjectGift', { organization, number: mail.orderNumber }),
    ),
    title: t('receipt.title', { name: mail.customerName }),
    preview:
      count > 0
        ? t('receipt.preview', { count, total, days })
        : t('receipt.previewGift', { total, organization }),
    intro: count > 0 ? `${paid} ${gift}`.trim() : t('receipt.introGift', { total, organization }),
    paidOn: fullDay(mail.paidAt, mail.timeZone, locale),
    credit,
    helps: t(mail.organizationBearsCardFees === false ? 'receipt.helpsInFull' : 'receipt.helps', {
      percent: percentOf(mail.organizationShareBp, locale),
      organization,
    }),
    days,
    handover: t(`receipt.handover.${mail.handover ?? 'seller_family'}`),
    food: foodFacts(mail.lines, mail.deliveryFrom, words),
    bestQualityFrom: t('receipt.bestQualityFrom', { day: formatDay(mail.deliveryFrom, locale) }),
    sums: [
      { name: t('order.items'), cents: mail.itemsCents },
      { name: t('order.gift', { organization }), cents: mail.giftCents },
      { name: t('order.tax'), cents: mail.taxCents },
      { name: t('order.cover'), cents: mail.coverCents },
    ].filter(sum => sum.cents > 0),
    total,
    footer: [t('common.sentFor', { organization }), t('receipt.noReply')],
  }
}
