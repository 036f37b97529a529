import { type AllergenStatement, statementProblems, unionStatement } from '#shared/allergens/allergens.ts'
import { allergenSentence } from '#shared/allergens/wording.ts'
import {
  bestQualityUntil,
  type StorageClass,
  storageStatements,
  unionStorage,
} from '#shared/storage/storage.ts'
import { dayRange } from './parts/formats.ts'
import type { Words } from './parts/words.ts'

export type FoodLine = {
  itemCode: string
  name: string
  allergens: AllergenStatement
  storage: string
  /** Least and most months of best quality in a freezer; null where no published row fits the item. */
  bestQualityMonths: [number, number] | null
}

export type FoodFacts = {
  allergens: { code: string; name: string; sentence: string }[]
  /** The statement of the whole order, where it has more than one item. */
  together: string | null
  /** What holds for all of the order has no names; the rest names the items it is about. */
  storage: { about: string[]; sentence: string }[]
  bestQuality: { months: string; days: string; names: string[] }[]
}

/** What a frozen package needs in any case; beyond it a class says what it needs itself. */
const everyFrozen = storageStatements('frozen_ready')

/** Allergens, storage and best quality of what was ordered, in the words they have everywhere. */
export function foodFacts(lines: readonly FoodLine[], deliveryFrom: string, words: Words): FoodFacts {
  const items = [...new Map(lines.map(line => [`${line.itemCode} ${line.name}`, line])).values()]
  return {
    allergens: items.map(item => ({
      code: item.itemCode,
      name: item.name,
      sentence: allergenSentence(item.allergens, words.food, words.locale),
    })),
    together: together(items, words),
    storage: storage(items, words),
    bestQuality: bestQuality(items, deliveryFrom, words),
  }
}

/** Left out where an item's own statement cannot stand: the sum would then say less than there is. */
function together(items: readonly FoodLine[], { food, locale }: Words): string | null {
  if (items.length < 2 || items.some(item => statementProblems(item.allergens).length > 0)) return null
  return allergenSentence(unionStatement(items.map(item => item.allergens)), food, locale)
}

function storage(items: readonly FoodLine[], { t, food }: Words): FoodFacts['storage'] {
  const classOf = (item: FoodLine) => item.storage as StorageClass
  return unionStorage(items.map(classOf)).map(key => {
    const concerned = items.filter(item => storageStatements(classOf(item)).includes(key))
    const about = everyFrozen.includes(key) ? [t('receipt.frozenItems')] : concerned.map(item => item.name)
    return {
      about: concerned.length === items.length ? [] : about,
      sentence: food(key),
    }
  })
}

/** Items that keep equally long stand together; the longest last. */
function bestQuality(
  items: readonly FoodLine[],
  deliveryFrom: string,
  { t, locale }: Words,
): FoodFacts['bestQuality'] {
  const windows = new Map<string, { months: [number, number]; names: string[] }>()
  for (const { name, bestQualityMonths: months } of items) {
    if (months === null) continue
    const window = windows.get(months.join()) ?? { months, names: [] }
    window.names.push(name)
    windows.set(months.join(), window)
  }
  return [...windows.values()]
    .sort((a, b) => a.months[1] - b.months[1] || a.months[0] - b.months[0])
    .map(({ months: [least, most], names }) => {
      const { from, to } = bestQualityUntil(deliveryFrom, [least, most])
      return {
        months: least === most ? t('receipt.months', { most }) : t('receipt.monthsRange', { least, most }),
        days: dayRange(from, to, locale),
        names,
      }
    })
}
