import { addMonths, type Day } from '../calendar.ts'
import { gramsToPounds } from '../weight.ts'

/** How a package is kept and what it is. */
export const storageClasses = [
  'frozen_ready',
  'frozen_raw_dough',
  'frozen_to_cook',
  'refrigerated_after_thaw',
  'shelf_stable',
] as const
export type StorageClass = (typeof storageClasses)[number]

/** Message keys of what is said about a class, always in the same order. */
const statementsByClass: Record<StorageClass, readonly string[]> = {
  frozen_ready: ['storage.keepFrozen', 'storage.thaw', 'storage.twoHours', 'storage.refreeze'],
  frozen_raw_dough: [
    'storage.keepFrozen',
    'storage.rawDough',
    'storage.thaw',
    'storage.twoHours',
    'storage.refreeze',
  ],
  frozen_to_cook: [
    'storage.keepFrozen',
    'storage.cook',
    'storage.thaw',
    'storage.twoHours',
    'storage.refreeze',
  ],
  refrigerated_after_thaw: [
    'storage.keepFrozen',
    'storage.refrigerate',
    'storage.thaw',
    'storage.twoHours',
    'storage.refreeze',
  ],
  shelf_stable: ['storage.shelf'],
}

export function storageStatements(storage: StorageClass): readonly string[] {
  return statementsByClass[storage]
}

/** The statements of several items together, each once, cautions about raw food where any item needs them. */
export function unionStorage(classes: readonly StorageClass[]): string[] {
  const order = [
    'storage.keepFrozen',
    'storage.rawDough',
    'storage.cook',
    'storage.refrigerate',
    'storage.thaw',
    'storage.twoHours',
    'storage.refreeze',
    'storage.shelf',
  ]
  const said = new Set(classes.flatMap(name => statementsByClass[name]))
  return order.filter(key => said.has(key))
}

/** Short form for an item's row: the one or two things to know before buying. */
export function shortStatements(storage: StorageClass): readonly string[] {
  if (storage === 'frozen_raw_dough') return ['storage.keepFrozen', 'storage.rawDough']
  return [statementsByClass[storage][0]!]
}

/** Days between which an item is at its best, counted from delivery; about quality, never about safety. */
export function bestQualityUntil(delivered: Day, months: readonly [number, number]): { from: Day; to: Day } {
  return { from: addMonths(delivered, months[0]), to: addMonths(delivered, months[1]) }
}

/**
 * Months of best quality in a freezer, counted from delivery, by row of the FoodKeeper data (USDA FSIS with
 * Cornell University and FMI, version 128). About quality, never about safety; the maker's date goes before.
 * Rows that advise against freezing at home are left out: they say nothing of food sold frozen.
 */
export const bestQualityMonths: Readonly<Record<number, readonly [number, number]>> = {
  193: [2, 3], // soups and stews
  195: [3, 5], // bread, rolls and buns, commercial
  197: [6, 6], // cakes and muffins, commercial
  198: [3, 6], // cheesecake
  199: [8, 12], // cookies, soft
  200: [8, 12], // cookies, crisp
  203: [12, 12], // fruit cake
  207: [8, 8], // fruit pies
  208: [8, 8], // mincemeat pie
  209: [1, 2], // pecan pie
  210: [1, 2], // pumpkin pie
  211: [2, 3], // quiche
  246: [2, 2], // pie crust, ready to use
  247: [2, 2], // cookie dough bought refrigerated
  309: [12, 12], // bread or cookie dough bought frozen
  314: [9, 9], // pretzels bought frozen
  315: [10, 18], // fruit bought frozen
  317: [6, 6], // ice cream
  321: [3, 3], // pancakes and waffles bought frozen
  324: [9, 9], // sherbet and sorbet
  330: [12, 12], // entrees bought frozen
  331: [10, 18], // vegetables bought frozen
  450: [3, 3], // bagels, commercially frozen
  452: [3, 3], // muffins, packaged
  551: [12, 12], // puff pastry
  554: [2, 2], // pie crust, ready to bake
  571: [12, 12], // pizza bought frozen
  629: [3, 3], // vegetable soup
  635: [3, 3], // cinnamon rolls, baked
}

/** Hours in the refrigerator to thaw a package: a day for every five pounds or part of it. */
export function thawHours(pounds: number): number {
  return Math.ceil(pounds / 5) * 24
}

export function thawHoursOfGrams(grams: number): number {
  return thawHours(gramsToPounds(grams))
}

/** Hours that perishable food may be out of freezer or refrigerator: one in air above 90 °F, else two (USDA FSIS). */
export function hoursOutOfFreezer(airFahrenheit: number): 1 | 2 {
  return airFahrenheit > 90 ? 1 : 2
}

/**
 * Whether thawing food meets the published criteria for freezing again: ice crystals left, or a measured
 * product temperature at or below 40 °F (USDA FSIS). The criteria, not a promise that the food is safe.
 */
export function meetsRefreezeCriteria(product: { iceCrystals: boolean; fahrenheit: number | null }): boolean {
  return product.iceCrystals || (product.fahrenheit !== null && product.fahrenheit <= 40)
}

export function fahrenheitToCelsius(fahrenheit: number): number {
  return ((fahrenheit - 32) * 5) / 9
}
