import { formatMoney } from '#shared/money.ts'
import type { Locale } from '#shared/wire.ts'
import { plainLetter } from './parts/plain-letter.tsx'
import { mailTranslator } from './parts/say.ts'

export type RefundNotice = {
  locale: Locale
  orderNumber: string
  customerName: string
  refundedCents: number
  currency: string
  lines: { name: string; quantity: number }[]
  whole: boolean
  remainingTotalCents: number
  receiptUrl: string
  contact: { name: string; email: string }
}

/** Tells a customer what goes back to their card, and what of the order is left. */
export function renderOrderCanceled(mail: RefundNotice) {
  const t = mailTranslator(mail.locale)
  const amount = formatMoney(mail.refundedCents, mail)
  const number = mail.orderNumber
  return plainLetter({
    locale: mail.locale,
    ply: 'goldenrod',
    subject: t('refund.subject', { amount, number }),
    title: t('refund.title', { amount }),
    sentences: [
      mail.whole
        ? t('refund.whole', { number })
        : t('refund.part', { number, remaining: formatMoney(mail.remainingTotalCents, mail) }),
      ...(mail.lines.length > 0
        ? [`${t('refund.lines')}: ${mail.lines.map(line => `${line.quantity} × ${line.name}`).join(', ')}.`]
        : []),
    ],
    action: { href: mail.receiptUrl, label: t('refund.open') },
    after: [t('common.questions', mail.contact)],
    footer: 'Tallykin',
  })
}
