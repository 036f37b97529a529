import { allergenSentence } from '#shared/allergens/wording.ts'
import { formatMoney } from '#shared/money.ts'
import { type StorageClass, shortStatements } from '#shared/storage/storage.ts'
import type { StoreItem } from '#shared/stores/contract.ts'
import { formatWeight } from '#shared/weight.ts'
import { useWords } from '../../lib/i18n.tsx'
import { Button } from '../../ui/button.tsx'
import { FrostLine } from '../../ui/frost-note.tsx'
import { ItemCode } from '../../ui/item-code.tsx'
import { Stepper } from '../../ui/stepper.tsx'

type ItemRowProps = {
  item: StoreItem
  eager: boolean
  currency: string
  maxQuantity: number
  quantity: number
  onQuantity: ((item: StoreItem, quantity: number) => void) | null
}

/** One item: picture, code, name, what is in it, how to keep it, its price, and how many of it. */
export function ItemRow({ item, eager, currency, maxQuantity, quantity, onQuantity }: ItemRowProps) {
  const { t, food, locale } = useWords()
  return (
    <li className="grid grid-cols-[6.5rem_1fr] gap-x-4 gap-y-3 border-b border-rule py-5 sm:grid-cols-[9.25rem_1fr_auto] sm:gap-x-6">
      <Picture item={item} eager={eager} />
      <div className="min-w-0">
        <h3 className="text-[1.2rem] sm:text-[1.35rem]">
          <ItemCode code={item.code} className="mr-2.5 text-[0.86em]" />
          {item.name}
        </h3>
        <p className="mt-1 text-ink-soft">
          {t('store.serves', {
            pieces: item.pieces,
            weight: formatWeight(item.printedWeight, item.netWeightG, locale),
            serves: item.serves,
          })}
        </p>
        <p className="mt-1.5">{item.description}</p>
        <p className="mt-1 text-[0.92em] text-ink-soft">
          {t('store.preparation', { text: item.preparation })}
        </p>
        {item.dietary.map(claim => (
          <p key={claim.kind} className="mt-1 text-[0.92em] text-ink-soft">
            {t('store.certified', claim)}
          </p>
        ))}
        <div className="mt-2.5">
          <FrostLine>
            {allergenSentence(item.allergens, food, locale)}{' '}
            {shortStatements(item.storage as StorageClass)
              .map(key => food(key))
              .join(' ')}
          </FrostLine>
        </div>
      </div>
      <div className="col-span-2 flex items-center justify-between gap-4 sm:col-span-1 sm:flex-col sm:items-end">
        <span className="tabular text-[1.3rem] font-semibold">
          {formatMoney(item.priceCents, { locale, currency })}
        </span>
        <Choosing item={item} quantity={quantity} maxQuantity={maxQuantity} onQuantity={onQuantity} />
      </div>
    </li>
  )
}

function Choosing({
  item,
  quantity,
  maxQuantity,
  onQuantity,
}: Pick<ItemRowProps, 'item' | 'quantity' | 'maxQuantity' | 'onQuantity'>) {
  const { t } = useWords()
  if (!item.available) return <span className="font-semibold text-stamp">{t('store.notAvailable')}</span>
  if (!onQuantity) return null
  if (quantity === 0)
    return (
      <Button
        aria-label={t('store.addNamed', { item: item.name })}
        className="no-print min-w-24"
        onClick={() => onQuantity(item, 1)}
      >
        {t('store.add')}
      </Button>
    )
  return (
    <Stepper
      value={quantity}
      max={maxQuantity}
      onChange={value => onQuantity(item, value)}
      labels={{
        group: t('pad.quantityOf', { item: item.name }),
        amount: t('pad.quantityOf', { item: item.name }),
        less: t('pad.less', { item: item.name }),
        more: t('pad.more', { item: item.name }),
      }}
    />
  )
}

function Picture({ item, eager }: { item: StoreItem; eager: boolean }) {
  if (!item.picture) return <span className="hatched aspect-[6/5] w-full rounded-sm" />
  const { small, large, width, height } = item.picture
  return (
    <img
      src={small}
      srcSet={`${small} 480w, ${large} 960w`}
      sizes="(min-width: 640px) 148px, 104px"
      width={width}
      height={height}
      alt=""
      loading={eager ? 'eager' : 'lazy'}
      decoding="async"
      className="aspect-[6/5] w-full rounded-sm"
    />
  )
}
