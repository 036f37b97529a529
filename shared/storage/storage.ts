import { addMonths, type Day } from '../calendar.ts'

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
  frozen_to_cook: ['storage.keepFrozen', 'storage.cook', 'storage.thaw', 'storage.twoHours', 'storage.refreeze'],
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
  const order = ['storage.keepFrozen', 'storage.rawDough', 'storage.cook', 'storage.refrigerate', 'storage.thaw', 'storage.twoHours', 'storage.refreeze', 'storage.shelf']
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

/** Hours in the refrigerator to thaw a package: a day for every five pounds or part of it. */
export function thawHours(pounds: number): number {
  return Math.ceil(pounds / 5) * 24
}

export function fahrenheitToCelsius(fahrenheit: number): number {
  return ((fahrenheit - 32) * 5) / 9
}
