import { formatInstant } from '#shared/deadline/formatting.ts'
import { formatMoney } from '#shared/money.ts'
import type { ReceiptView } from '#shared/orders/contract.ts'
import { useWords } from '../../lib/i18n.tsx'
import { buttonClass } from '../../ui/button.tsx'
import { Stamp } from '../../ui/stamp.tsx'

/** Where the order stands, in a stamp and in plain words, and what can be done now. */
export function ReceiptStatus({ view }: { view: ReceiptView }) {
  const { t, locale } = useWords()
  const refunded = formatMoney(view.refundedCents, { locale, currency: view.currency })
  const count = view.lines.reduce((sum, line) => sum + line.quantity, 0)
  const says = {
    paid: {
      stamp: <Stamp word={t('receipt.stamp.paid')} ink="paid" />,
      title: t('receipt.paid', { name: view.customerName }),
      body: t('receipt.paidBody', { credit: view.creditedTo, count }),
    },
    partly_refunded: {
      stamp: <Stamp word={t('receipt.stamp.paid')} ink="paid" />,
      title: t('receipt.partly_refunded', { amount: refunded }),
      body: t('receipt.refundedBody'),
    },
    refunded: {
      stamp: <Stamp word={t('receipt.stamp.refunded')} ink="stamp" />,
      title: t('receipt.refunded', { amount: refunded }),
      body: t('receipt.refundedBody'),
    },
    expired: {
      stamp: <Stamp word={t('receipt.stamp.expired')} ink="stamp" />,
      title: t('receipt.expired'),
      body: t('receipt.expiredBody'),
    },
    canceled: {
      stamp: <Stamp word={t('receipt.stamp.canceled')} ink="stamp" />,
      title: t('receipt.canceled'),
      body: t('receipt.canceledBody'),
    },
    awaiting_payment: {
      stamp: null,
      title: t('receipt.awaiting_payment'),
      body: view.payableUntil
        ? t('receipt.awaitingBody', {
            time: formatInstant(Date.parse(view.payableUntil), view.drive.timeZone, locale),
          })
        : '',
    },
  }[view.status]
  return (
    <div role="status">
      <div className="flex flex-wrap items-center gap-x-6 gap-y-4">
        <h1 className="min-w-60 flex-1 text-[1.7rem] sm:text-[2rem]">{says.title}</h1>
        {says.stamp}
      </div>
      <p className="mt-2">{says.body}</p>
      {view.status === 'awaiting_payment' && view.payUrl && (
        <p className="mt-4">
          <a className={`${buttonClass('primary')} no-underline`} href={view.payUrl}>
            {t('receipt.goOn')}
          </a>
        </p>
      )}
    </div>
  )
}
