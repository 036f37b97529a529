import { formatAmount, formatMoney } from '#shared/money.ts'
import type { ReceiptView } from '#shared/orders/contract.ts'
import { useWords } from '../../lib/i18n.tsx'
import { ItemCode } from '../../ui/item-code.tsx'

/** The lines of the order on their rules, and the sums below. */
export function ReceiptLines({ view }: { view: ReceiptView }) {
  const { t, locale } = useWords()
  const sums = [
    { name: t('pad.itemsCents'), cents: view.itemsCents },
    { name: t('pad.gift', { organization: view.organization.name }), cents: view.giftCents },
    { name: t('pad.tax'), cents: view.taxCents },
    { name: t('pad.cover'), cents: view.coverCents },
  ].filter(sum => sum.cents > 0)
  const isPaid = ['paid', 'partly_refunded', 'refunded'].includes(view.status)
  return (
    <section aria-labelledby="receipt-items" className="mt-8">
      <h2 id="receipt-items" className="pb-2 text-[1.4rem] double-rule">
        {t('receipt.items')}
      </h2>
      <ul>
        {view.lines.map((line, place) => (
          <li key={place} className="grid grid-cols-[1fr_auto] gap-x-4 border-b border-rule py-3">
            <span>
              <ItemCode code={line.itemCode} className="mr-2 text-[0.86em]" />
              {line.name}
            </span>
            <span className="tabular text-right">{formatAmount(line.amountCents, locale)}</span>
            <span className="text-[0.92em] text-ink-soft">
              {t('receipt.line', {
                quantity: line.quantity,
                price: formatAmount(line.unitPriceCents, locale),
              })}
              {line.recipientLabel !== null && (
                <>
                  {' · '}
                  <bdi>{t('receipt.for', { label: line.recipientLabel })}</bdi>
                </>
              )}
              {line.refundedQuantity > 0 && (
                <b className="text-stamp"> · {t('receipt.lineRefunded', { count: line.refundedQuantity })}</b>
              )}
            </span>
          </li>
        ))}
      </ul>
      <div className="grid gap-1 pt-3">
        {sums.map(sum => (
          <p key={sum.name} className="flex justify-between gap-4">
            <span>{sum.name}</span>
            <span className="tabular">{formatAmount(sum.cents, locale)}</span>
          </p>
        ))}
        <p className="mt-1 flex justify-between gap-4 border-t-[1.5px] border-ink pt-2 font-display text-[1.5rem] font-bold">
          <span>{isPaid ? t('receipt.totalPaid') : t('receipt.total')}</span>
          <span>{formatMoney(view.totalCents, { locale, currency: view.currency })}</span>
        </p>
        {view.refundedCents > 0 && (
          <p className="flex justify-between gap-4 font-semibold text-stamp">
            <span>{t('receipt.refundedLine')}</span>
            <span className="tabular">−{formatAmount(view.refundedCents, locale)}</span>
          </p>
        )}
      </div>
    </section>
  )
}
