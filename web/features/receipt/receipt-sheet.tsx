import { formatDays, formatInstant } from '#shared/deadline/formatting.ts'
import type { ReceiptView } from '#shared/orders/contract.ts'
import { useWords } from '../../lib/i18n.tsx'
import { Button, buttonClass } from '../../ui/button.tsx'
import { Facts } from '../../ui/facts.tsx'
import { FrostNote } from '../../ui/frost-note.tsx'
import { Sheet } from '../../ui/sheet.tsx'
import { ReceiptLines } from './receipt-lines.tsx'
import { ReceiptStatus } from './receipt-status.tsx'

/** The customer's ply of the order: what was ordered, paid, credited, and how to keep it. */
export function ReceiptSheet({ view }: { view: ReceiptView }) {
  const { t, locale } = useWords()
  const { drive } = view
  const hasFood = view.lines.length > 0
  const isPaid = ['paid', 'partly_refunded', 'refunded'].includes(view.status)
  return (
    <Sheet ply="goldenrod" className="px-4 pb-8 pt-6 sm:px-9">
      <ReceiptStatus view={view} />
      <div className="mt-6">
        <Facts
          rows={[
            { name: t('receipt.fact.number'), value: <span className="tabular">{view.orderNumber}</span> },
            {
              name: t('receipt.fact.placed'),
              value: formatInstant(Date.parse(view.placedAt), drive.timeZone, locale),
            },
            { name: t('receipt.fact.credit'), value: `${view.creditedTo}, ${view.organization.name}` },
            ...(hasFood
              ? [
                  {
                    name: t('receipt.fact.arrives'),
                    value: (
                      <>
                        {formatDays(drive.deliveryFrom, drive.deliveryTo, locale)}
                        <span className="block text-[0.92em] font-normal">
                          {view.handover === 'school' ? t('receipt.howSchool') : t('receipt.how')}
                        </span>
                      </>
                    ),
                  },
                ]
              : []),
            {
              name: t('receipt.fact.questions'),
              value: (
                <>
                  {t('store.contact', { name: view.contact.name })} ·{' '}
                  <a href={`mailto:${view.contact.email}`}>{t('store.write')}</a>
                </>
              ),
            },
          ]}
        />
      </div>
      <ReceiptLines view={view} />
      {hasFood && (
        <div className="mt-7">
          <FrostNote title={t('pad.frost')}>
            <h3 className="text-lg">{t('receipt.allergens')}</h3>
            <ul className="grid gap-1.5">
              {view.statements.allergens.map(item => (
                <li key={item.name}>
                  <b>{item.name}.</b> {item.text}
                </li>
              ))}
            </ul>
            <h3 className="mt-2 text-lg">{t('receipt.storage')}</h3>
            <ul className="grid gap-1.5">
              {view.statements.storage.map(sentence => (
                <li key={sentence}>{sentence}</li>
              ))}
            </ul>
            <p className="font-semibold">{t('pad.readLabel')}</p>
          </FrostNote>
        </div>
      )}
      <div className="no-print mt-7 flex flex-wrap items-center gap-3">
        {isPaid && <Button onClick={() => window.print()}>{t('receipt.print')}</Button>}
        {view.storeUrl && (
          <a className={buttonClass('quiet')} href={new URL(view.storeUrl).pathname}>
            {t('receipt.toStore')}
          </a>
        )}
      </div>
      <p className="mt-4 text-[0.9em] text-ink-soft">{t('receipt.keep')}</p>
    </Sheet>
  )
}
