import { formatMoney } from '#shared/money.ts'
import type { Locale } from '#shared/wire.ts'
import { FactsTable } from './parts/facts-table.tsx'
import { writeLetter } from './parts/letter.tsx'
import { isolated, literalFacts } from './parts/literal.ts'
import { OrderTable } from './parts/order-table.tsx'
import { heading, indented } from './parts/plain-text.ts'
import { type Mail, wordsFor } from './parts/words.ts'
import { BoxedLetters, Subtitle } from './parts/writing.tsx'

export type RefundNotice = {
  locale: Locale
  orderNumber: string
  customerName: string
  refundedCents: number
  currency: string
  /** What is given back with this refund. */
  lines: { name: string; quantity: number }[]
  /** Nothing of the order is left. */
  whole: boolean
  remainingTotalCents: number
  receiptUrl: string
  contact: { name: string; email: string }
}

/** Tells a customer what goes back to their card, and what is left of the order. */
export async function renderOrderCanceled(props: RefundNotice): Promise<Mail> {
  const mail = literalFacts(props)
  const { t, locale } = wordsFor(mail.locale)
  const money = (cents: number) => formatMoney(cents, { locale, currency: mail.currency })
  const amount = money(mail.refundedCents)
  const number = mail.orderNumber
  const rows = [
    { name: t('receipt.number'), value: number },
    { name: t('refund.back'), value: amount },
    ...(mail.whole ? [] : [{ name: t('refund.left'), value: money(mail.remainingTotalCents) }]),
  ]
  return writeLetter({
    locale,
    ply: 'goldenrod',
    band: t('band.refund'),
    subject: t(mail.whole ? 'refund.subjectWhole' : 'refund.subject', { amount, number }),
    preview: t('refund.bank'),
    title: t('refund.title', { amount }),
    sentences: [
      t('common.dear', { name: mail.customerName }),
      `${t(mail.whole ? 'refund.whole' : 'refund.part', { number })} ${t('refund.bank')}`,
    ],
    facts: {
      html: (
        <>
          <FactsTable
            rows={rows.map((row, place) =>
              place === 0 ? { ...row, value: <BoxedLetters>{row.value}</BoxedLetters> } : row,
            )}
          />
          {mail.lines.length > 0 && (
            <>
              <Subtitle>{t('refund.lines')}</Subtitle>
              <OrderTable
                columns={[t('order.item'), t('order.quantity')]}
                rows={mail.lines.map(line => ({ name: line.name, amount: String(line.quantity) }))}
              />
            </>
          )}
        </>
      ),
      text: [
        ...rows.map(row => `${row.name}: ${row.value}`),
        ...(mail.lines.length > 0
          ? ['', ...heading(t('refund.lines')), ...indented(mail.lines.map(quantityLine))]
          : []),
      ],
    },
    action: { label: t('receipt.open'), url: mail.receiptUrl, plainLabel: t('receipt.private') },
    after: [t('common.questions', mail.contact)],
    footer: [t('common.sent'), t('common.noCard')],
  })
}

function quantityLine(line: { name: string; quantity: number }): string {
  return `${line.quantity} × ${isolated(line.name)}`
}
