import type { StoreItem, StoreView } from '#shared/stores/contract.ts'
import { useWords } from '../../lib/i18n.tsx'
import { ItemRow } from './item-row.tsx'

type CatalogListProps = {
  view: StoreView
  quantityOf: (code: string) => number
  /** Null where nothing can be ordered now. */
  onQuantity: ((item: StoreItem, quantity: number) => void) | null
}

/** The catalog as a form: categories with a double rule, items as its rows. */
export function CatalogList({ view, quantityOf, onQuantity }: CatalogListProps) {
  const { t } = useWords()
  const categories = view.categories
    .map(category => ({ ...category, items: view.items.filter(item => item.category === category.slug) }))
    .filter(category => category.items.length > 0)
  let shown = 0
  return (
    <div>
      <nav aria-label={t('store.jump')} className="mb-2 flex flex-wrap gap-x-1 gap-y-1">
        {categories.map(category => (
          <a
            key={category.slug}
            href={`#${category.slug}`}
            className="inline-flex min-h-11 items-center rounded-sm px-2.5 font-semibold hover:bg-sheet"
          >
            {category.name}
          </a>
        ))}
      </nav>
      {categories.map(category => (
        <section key={category.slug} aria-labelledby={category.slug} className="mb-9">
          <div className="flex flex-wrap items-baseline gap-x-4 pb-1.5 pt-2 double-rule">
            <h2 id={category.slug} className="scroll-mt-4 text-[1.45rem] sm:text-[1.6rem]">
              {category.name}
            </h2>
            <span className="text-ink-soft">{t('store.kinds', { count: category.items.length })}</span>
          </div>
          <ul>
            {category.items.map(item => {
              shown += 1
              return (
                <ItemRow
                  key={item.code}
                  item={item}
                  eager={shown <= 2}
                  currency={view.drive.currency}
                  maxQuantity={view.drive.limits.maxLineQuantity}
                  quantity={quantityOf(item.code)}
                  onQuantity={onQuantity}
                />
              )
            })}
          </ul>
        </section>
      ))}
    </div>
  )
}
