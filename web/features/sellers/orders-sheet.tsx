import { formatShortInstant } from '#shared/deadline/formatting.ts'
import type { SellerView } from '#shared/sellers/contract.ts'
import { useWords } from '../../lib/i18n.tsx'
import { Sheet } from '../../ui/sheet.tsx'
import { FlagDialog } from './flag-dialog.tsx'

/** The credited orders as they come in. A customer's e-mail address is not shown. */
export function OrdersSheet({ view }: { view: SellerView }) {
  const { t, locale } = useWords()
  return (
    <Sheet as="section" className="px-5 py-6 sm:px-7">
      <h2 className="pb-2 text-[1.35rem] double-rule">{t('family.orders')}</h2>
      {view.orders.length === 0 && <p className="py-4">{t('family.noOrders')}</p>}
      <ul aria-live="polite" aria-relevant="additions">
        {view.orders.map(order => (
          <li
            key={order.id}
            id={`order-${order.id}`}
            className="grid grid-cols-[1fr_auto] gap-x-4 gap-y-0.5 border-b border-rule py-3 target:bg-pink target:text-on-ply"
          >
            <span className="font-semibold">
              <bdi>{order.customerName}</bdi>{' '}
              <span className="font-normal text-ink-soft">{t(`relationship.${order.relationship}`)}</span>
            </span>
            <span className="tabular text-right font-semibold">{order.itemCount}</span>
            <span className="text-[0.95em]">
              {order.lines.map(line => `${line.quantity} × ${line.name}`).join(', ')}
              {order.status === 'refunded' && <b className="text-stamp"> · {t('family.refunded')}</b>}
              {order.status === 'partly_refunded' && (
                <b className="text-stamp"> · {t('family.partlyRefunded')}</b>
              )}
            </span>
            <span className="text-right text-[0.95em] text-ink-soft">
              {formatShortInstant(Date.parse(order.placedAt), view.drive.timeZone, locale)}
            </span>
            {order.flagged ? (
              <b className="text-stamp">{t('family.flag.flagged')}</b>
            ) : (
              order.status !== 'refunded' && <FlagDialog sellerId={view.sellerId} order={order} />
            )}
          </li>
        ))}
      </ul>
    </Sheet>
  )
}
