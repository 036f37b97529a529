import { useId } from 'react'
import { allergenSentence } from '#shared/allergens/wording.ts'
import { formatAmount, formatMoney } from '#shared/money.ts'
import { type StorageClass, unionStorage } from '#shared/storage/storage.ts'
import type { StoreView } from '#shared/stores/contract.ts'
import { useWords } from '../../lib/i18n.tsx'
import { Button } from '../../ui/button.tsx'
import { FrostNote } from '../../ui/frost-note.tsx'
import { ItemCode } from '../../ui/item-code.tsx'
import { Notice } from '../../ui/notice.tsx'
import { Stepper } from '../../ui/stepper.tsx'
import { OrderForm } from './order-form.tsx'
import { type Pad, type PadStore, setQuantity, undoRemoval } from './pad.ts'
import type { PricedPad } from './price-pad.ts'

export type PadProps = {
  token: string
  view: StoreView
  pad: Pad
  priced: PricedPad
  change: PadStore['change']
}

/** The order pad: ruled lines, totals at the foot, a perforation, and below it the part that is torn off to pay. */
export function OrderPad(props: PadProps) {
  const { view, pad, priced, change } = props
  const { t } = useWords()
  const removed = pad.removed && view.items.find(item => item.code === pad.removed!.code)
  return (
    <div>
      {priced.gone.length > 0 && (
        <div className="px-5 pt-4">
          <Notice look="problem" title={t('pad.goneTitle')}>
            {priced.gone.map(line => (
              <p key={line.code}>{t('pad.gone', { item: line.item?.name ?? line.code })}</p>
            ))}
          </Notice>
        </div>
      )}
      <ul>
        {priced.lines.map(line => (
          <PadRow key={line.code} line={line} view={view} change={change} />
        ))}
      </ul>
      {priced.lines.length === 0 && (
        <>
          <p className="border-b border-rule px-5 py-3 text-ink-soft">{t('pad.empty')}</p>
          <div className="h-11 border-b border-rule" />
        </>
      )}
      <div aria-live="polite">
        {removed && (
          <p className="flex flex-wrap items-center justify-between gap-x-3 border-b border-rule px-5 py-1">
            {t('pad.removed', { item: removed.name })}
            <Button look="quiet" onClick={() => change(undoRemoval)}>
              {t('pad.undo')}
            </Button>
          </p>
        )}
      </div>
      <OrderForm
        {...props}
        totals={<Totals view={view} priced={priced} />}
        frost={<PadFrost priced={priced} />}
      />
    </div>
  )
}

function PadRow({
  line,
  view,
  change,
}: {
  line: PricedPad['lines'][number]
  view: StoreView
  change: PadStore['change']
}) {
  const { t, locale } = useWords()
  const name = line.item?.name ?? line.code
  const isOffered = line.item?.available ?? false
  return (
    <li className="grid grid-cols-[1fr_auto] gap-x-3 gap-y-1 border-b border-rule px-5 py-3">
      <span className={isOffered ? '' : 'line-through'}>
        <ItemCode code={line.code} className="mr-2 text-[0.84em]" />
        {name}
      </span>
      <span className="tabular text-right">
        {isOffered ? formatAmount(line.quantity * line.item!.priceCents, locale) : '—'}
      </span>
      <span className="flex flex-wrap items-center gap-3">
        {isOffered && (
          <Stepper
            value={line.quantity}
            max={view.drive.limits.maxLineQuantity}
            onChange={quantity => change(pad => setQuantity(pad, line.code, quantity))}
            labels={{
              group: t('pad.quantityOf', { item: name }),
              amount: t('pad.quantityOf', { item: name }),
              less: t('pad.less', { item: name }),
              more: t('pad.more', { item: name }),
            }}
          />
        )}
        {isOffered && (
          <span className="text-[0.9em] text-ink-soft">× {formatAmount(line.item!.priceCents, locale)}</span>
        )}
      </span>
      <Button
        look="quiet"
        className="justify-self-end text-[0.9em]"
        aria-label={t('pad.remove', { item: name })}
        onClick={() => change(pad => setQuantity(pad, line.code, 0))}
      >
        {t('pad.removeShort')}
      </Button>
    </li>
  )
}

function Totals({ view, priced }: { view: StoreView; priced: PricedPad }) {
  const { t, locale } = useWords()
  const id = useId()
  const { order } = priced
  if (!order) return null
  const rows = [
    { name: t('pad.itemsCents'), cents: order.itemsCents },
    { name: t('pad.gift', { organization: view.organization.name }), cents: order.giftCents },
    { name: t('pad.tax'), cents: order.taxCents },
    { name: t('pad.cover'), cents: order.coverCents },
  ].filter(row => row.cents > 0)
  const total = formatMoney(order.totalCents, { locale, currency: view.drive.currency })
  return (
    <div className="grid gap-1 px-5 py-4">
      {rows.map(row => (
        <p key={row.name} className="flex justify-between gap-4">
          <span>{row.name}</span>
          <span className="tabular">{formatAmount(row.cents, locale)}</span>
        </p>
      ))}
      <p className="mt-1.5 flex justify-between gap-4 border-t-[1.5px] border-ink pt-2 font-display text-[1.5rem] font-bold leading-tight">
        <span id={id}>{t('pad.total')}</span>
        <span>{total}</span>
      </p>
      <p className="sr-only" aria-live="polite">
        {t('pad.totalIs', { count: order.itemCount, total })}
      </p>
    </div>
  )
}

/** The statements of everything on the pad, before it is paid. */
function PadFrost({ priced }: { priced: PricedPad }) {
  const { t, food, locale } = useWords()
  const items = priced.lines.flatMap(line => (line.item?.available ? [line.item] : []))
  if (items.length === 0) return null
  return (
    <FrostNote title={t('pad.frost')} level={3}>
      <ul className="grid gap-1.5 text-[0.92em]">
        {items.map(item => (
          <li key={item.code}>
            <b>{item.name}.</b> {allergenSentence(item.allergens, food, locale)}
          </li>
        ))}
      </ul>
      <ul className="grid gap-1.5 text-[0.92em]">
        {unionStorage(items.map(item => item.storage as StorageClass)).map(key => (
          <li key={key}>{food(key)}</li>
        ))}
      </ul>
      <p className="text-[0.92em] font-semibold">{t('pad.readLabel')}</p>
    </FrostNote>
  )
}
