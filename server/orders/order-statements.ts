import type { AllergenStatement } from '#shared/allergens/allergens.ts'
import { allergenSentence } from '#shared/allergens/wording.ts'
import { foodTranslator } from '#shared/messages/food.ts'
import { type StorageClass, unionStorage } from '#shared/storage/storage.ts'
import type { OrderLineRow } from './queries.ts'

type StatedLine = Pick<OrderLineRow, 'name' | 'contains' | 'containsNone' | 'mayContain' | 'storage'>

/** The allergen statement of each item and the storage statements of the order, in words. */
export function orderStatements(lines: readonly StatedLine[], locale: 'en' | 'es') {
  const t = foodTranslator(locale)
  const stated = new Map<string, string>()
  for (const line of lines) {
    const statement: AllergenStatement & { containsNone: boolean } = {
      contains: JSON.parse(line.contains),
      containsNone: line.containsNone,
      mayContain: JSON.parse(line.mayContain),
    }
    stated.set(line.name, allergenSentence(statement, t, locale))
  }
  const keys = unionStorage(lines.map(line => line.storage as StorageClass))
  return {
    allergens: [...stated].map(([name, text]) => ({ name, text })),
    storage: keys.map(key => t(key)),
  }
}
