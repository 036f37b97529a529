import { type StoreItem, storeItem } from '#shared/stores/contract.ts'
import type { Locale } from '#shared/wire.ts'
import type { Db } from '../db/open.ts'
import { type CatalogItem, listCategories, listItems, safetyMark } from './queries.ts'

export type KeptCatalog = {
  items: StoreItem[]
  byCode: Map<string, CatalogItem>
  categories: { slug: string; name: string }[]
  /** `"categories":[…],"items":[…]` ready to be put into a reply. */
  json: string
}

type Kept = { mark: number; checkedAt: number; catalog: KeptCatalog }
const kept = new WeakMap<Db, Map<string, Kept>>()

/** How long a kept catalog is trusted before the safety mark is looked at again. */
const TRUST_MS = 1_000

/**
 * The catalog of a drive, serialised once. A commercial version never changes; a safety correction does, so
 * the mark of the newest revision in force is compared at most a second after it took effect.
 */
export function keptCatalog(
  db: Db,
  of: { versionId: number; catalogId: number; locale: Locale },
  now: number,
): KeptCatalog {
  let ofThisDb = kept.get(db)
  if (!ofThisDb) {
    ofThisDb = new Map()
    kept.set(db, ofThisDb)
  }
  const key = `${of.versionId}:${of.locale}`
  const known = ofThisDb.get(key)
  if (known && now >= known.checkedAt && now - known.checkedAt < TRUST_MS) return known.catalog
  const mark = safetyMark(db.orm, { catalogId: of.catalogId, at: now })
  if (known && known.mark === mark) {
    known.checkedAt = now
    return known.catalog
  }
  const catalog = load(db, of, now)
  ofThisDb.set(key, { mark, checkedAt: now, catalog })
  return catalog
}

function load(db: Db, of: { versionId: number; catalogId: number; locale: Locale }, at: number): KeptCatalog {
  const rows = listItems(db.orm, { ...of, at })
  const items = rows.map(row => storeItem.parse(toStoreItem(row)))
  const categories = listCategories(db.orm, of.versionId, of.locale)
  return {
    items,
    byCode: new Map(rows.map(row => [row.code, row])),
    categories,
    json: `"categories":${JSON.stringify(categories)},"items":${JSON.stringify(items)}`,
  }
}

function toStoreItem(row: CatalogItem): StoreItem {
  return {
    code: row.code,
    name: row.text.name,
    category: row.category,
    priceCents: row.priceCents,
    netWeightG: row.netWeightG,
    printedWeight: row.printedWeight,
    pieces: row.text.pieces,
    serves: row.text.serves,
    description: row.text.description,
    preparation: row.text.preparation,
    taxCategory: row.taxCategory,
    allergens: {
      contains: row.safety.contains,
      containsNone: row.safety.containsNone,
      mayContain: row.safety.mayContain,
    },
    storage: row.safety.storage,
    bestQualityMonths: row.safety.bestQualityMonths,
    dietary: JSON.parse(row.dietary),
    picture: row.pictureHash
      ? {
          small: `/pictures/${row.pictureHash}-480.webp`,
          large: `/pictures/${row.pictureHash}-960.webp`,
          width: 480,
          height: 400,
        }
      : null,
    available: row.available,
  }
}
