import { formatShortInstant } from '#shared/deadline/formatting.ts'
import type { OrderPageView } from '#shared/drives/orders-contract.ts'
import { formatAmount, formatMoney } from '#shared/money.ts'
import { type MessageKey, useWords } from '../../lib/i18n.tsx'
import { Facts } from '../../ui/facts.tsx'
import { ItemCode } from '../../ui/item-code.tsx'
import { Sheet } from '../../ui/sheet.tsx'
import { FlagsSheet } from './flags-sheet.tsx'
import { MoveDialog } from './move-dialog.tsx'
import { RefundDialog } from './refund-dialog.tsx'
import { StatusWord } from './status-word.tsx'

/** An order on the organizer desk: what it is, what can be done with it, and everything that happened to it. */
export function OrderSheets({ driveId, view }: { driveId: string; view: OrderPageView }) {
  return (
    <div className="grid items-start gap-6 lg:grid-cols-[minmax(0,1.15fr)_minmax(0,1fr)]">
      <div className="grid gap-6">
        <FlagsSheet driveId={driveId} view={view} />
        <MainSheet driveId={driveId} view={view} />
      </div>
      <HistorySheet view={view} />
    </div>
  )
}

function MainSheet({ driveId, view }: { driveId: string; view: OrderPageView }) {
  const { t, locale } = useWords()
  const money = (cents: number) => formatMoney(cents, { locale, currency: 'usd' })
  const at = (iso: string) => formatShortInstant(Date.parse(iso), view.timeZone, locale)
  const sums = [
    { name: t('pad.itemsCents'), cents: view.itemsCents },
    { name: t('organizer.gifts'), cents: view.giftCents },
    { name: t('pad.tax'), cents: view.taxCents },
    { name: t('pad.cover'), cents: view.coverCents },
  ].filter(sum => sum.cents > 0)
  return (
    <Sheet as="section" labelledBy="order-title" className="px-5 py-6 sm:px-7">
      <div className="flex flex-wrap items-baseline justify-between gap-3">
        <h2 id="order-title" className="text-[1.5rem]">
          {t('order.title', { number: view.number })}
        </h2>
        <StatusWord status={view.status} />
      </div>
      <div className="mt-3">
        <Facts
          rows={[
            {
              name: t('order.customer'),
              value: (
                <>
                  <bdi>{view.customer.name}</bdi>
                  <span className="block font-normal">
                    {t(`relationship.${view.customer.relationship}`)} ·{' '}
                    <a href={`mailto:${view.customer.email}`}>{view.customer.email}</a>
                  </span>
                </>
              ),
            },
            {
              name: t('order.credited'),
              value: view.sellers
                .map(seller =>
                  `${seller.number ?? ''} ${seller.name}${seller.number === null || seller.group === null ? '' : `, ${seller.group}`}`.trim(),
                )
                .join('; '),
            },
            { name: t('order.placed'), value: at(view.placedAt) },
            ...(view.paidAt === null ? [] : [{ name: t('order.paid'), value: at(view.paidAt) }]),
          ]}
        />
      </div>
      <ul className="mt-5 border-t-[1.5px] border-ink">
        {view.lines.map(line => (
          <li key={line.lineId} className="grid grid-cols-[1fr_auto] gap-x-4 border-b border-rule py-2.5">
            <span>
              <ItemCode code={line.itemCode} className="mr-2 text-[0.86em]" />
              {line.name}
              {line.recipientLabel !== null && (
                <bdi className="text-ink-soft"> · {t('receipt.for', { label: line.recipientLabel })}</bdi>
              )}
            </span>
            <span className="tabular">{formatAmount(line.amountCents, locale)}</span>
            <span className="text-[0.92em] text-ink-soft">
              {t('receipt.line', {
                quantity: line.quantity,
                price: formatAmount(line.unitPriceCents, locale),
              })}
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
        <p className="flex justify-between gap-4 border-t-[1.5px] border-ink pt-1.5 font-display text-[1.3rem] font-bold">
          <span>{t('pad.total')}</span>
          <span>{money(view.totalCents)}</span>
        </p>
        {view.refundedCents > 0 && (
          <p className="flex justify-between gap-4 font-semibold text-stamp">
            <span>{t('receipt.refundedLine')}</span>
            <span className="tabular">−{formatAmount(view.refundedCents, locale)}</span>
          </p>
        )}
      </div>
      {(view.mayRefund || view.mayMove) && (
        <div className="mt-6 flex flex-wrap gap-3">
          {view.mayMove && <MoveDialog driveId={driveId} view={view} />}
          {view.mayRefund && view.refundableCents !== null && <RefundDialog driveId={driveId} view={view} />}
        </div>
      )}
    </Sheet>
  )
}

const actions = new Set([
  'order_placed',
  'order_paid',
  'order_expired',
  'refund_requested',
  'refunded',
  'refund_failed',
  'order_moved',
  'order_flagged',
  'flag_resolved',
])
const letters = new Set(['receipt', 'guardian_notice', 'refund_notice'])
const actors = new Set(['customer', 'payment_service', 'system'])

function HistorySheet({ view }: { view: OrderPageView }) {
  const { t, locale } = useWords()
  const at = (iso: string) => formatShortInstant(Date.parse(iso), view.timeZone, locale)
  const money = (cents: number) => formatMoney(cents, { locale, currency: 'usd' })
  return (
    <Sheet as="section" className="grid gap-6 px-5 py-6 sm:px-7">
      {view.refunds.length > 0 && (
        <div>
          <h2 className="text-[1.25rem]">{t('order.refunds')}</h2>
          <ul>
            {view.refunds.map(given => (
              <li key={given.at + given.amountCents} className="border-b border-rule py-2">
                <b>{money(given.amountCents)}</b> · {t(`order.refund.${given.state}` as MessageKey)} ·{' '}
                {at(given.at)}
                <span className="block text-[0.95em]">
                  {given.lines.join(', ')} <bdi className="text-ink-soft">{given.reason}</bdi>
                </span>
              </li>
            ))}
          </ul>
        </div>
      )}
      <div>
        <h2 className="text-[1.25rem]">{t('order.history')}</h2>
        <ol>
          {view.history.map((entry, place) => (
            <li key={place} className="grid grid-cols-[7.5rem_1fr] gap-x-3 border-b border-rule py-2">
              <span className="text-ink-soft">{at(entry.at)}</span>
              <span>
                <b>
                  {t(
                    (actions.has(entry.action)
                      ? `order.action.${entry.action}`
                      : 'order.action.other') as MessageKey,
                  )}
                </b>{' '}
                · {actors.has(entry.who) ? t(`order.who.${entry.who}` as MessageKey) : entry.who}
                {entry.reason && <bdi className="block text-[0.95em]">{entry.reason}</bdi>}
              </span>
            </li>
          ))}
        </ol>
      </div>
      {view.letters.length > 0 && (
        <div>
          <h2 className="text-[1.25rem]">{t('order.letters')}</h2>
          <ul>
            {view.letters.map((letter, place) => (
              <li key={place} className="border-b border-rule py-2">
                {t(
                  (letters.has(letter.kind)
                    ? `order.letter.${letter.kind}`
                    : 'order.letter.other') as MessageKey,
                )}{' '}
                · <bdi>{letter.to}</bdi> · {t(`order.letter.${letter.state}` as MessageKey)} · {at(letter.at)}
              </li>
            ))}
          </ul>
        </div>
      )}
    </Sheet>
  )
}
