import type { Allergen } from '#shared/allergens/allergens.ts'
import type { StorageClass } from '#shared/storage/storage.ts'

export type CategorySlug =
  | 'soups_and_chowders'
  | 'hand_pies'
  | 'dumplings'
  | 'breads_and_pretzels'
  | 'breakfast'
  | 'sweets_and_doughs'

export type InBoth = { en: string; es: string }

/** An item of the demonstration's catalog, with every fact the product keeps of one. All invented. */
export type DemoItem = {
  /** Four digits, at least two slips of the pen from every other item's. */
  code: string
  slug: string
  name: string
  nameEs: string
  category: CategorySlug
  priceCents: number
  taxCategory: 'food'
  /** Whole grams, rounded down from the printed ounces so that they never say more than is inside. */
  netWeightG: number
  printedWeight: string
  pieces: InBoth
  serves: InBoth
  description: InBoth
  preparation: InBoth
  storage: StorageClass
  /** Row of the FoodKeeper data that fits the food as it is sold, if one does. */
  foodKeeperRow: number | null
  bestQualityMonths: readonly [min: number, max: number] | null
  contains: Allergen[]
  /** The empty `contains` is meant. */
  containsNone: boolean
  mayContain: Allergen[]
  dietary: { kind: string; certifier: string }[]
  casePack: number
  /** Outer size of one unit. */
  volumeMl: number
}
