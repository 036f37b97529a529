import type { Locale } from '../wire.ts'
import { type AllergenStatement, sorted } from './allergens.ts'

type Translate = (key: string, values?: Record<string, unknown>) => string

/**
 * "Contains: Wheat, Milk, Pecan. May contain: Peanut." The one wording on item, order pad, receipt and slip.
 * An empty statement never says that something is free of anything, and one that nobody confirmed says so.
 */
export function allergenSentence(statement: AllergenStatement, t: Translate, _locale: Locale): string {
  const names = (list: readonly string[]) =>
    sorted(list)
      .map(name => t(`allergen.${name}`))
      .join(', ')
  const contains =
    statement.contains.length > 0
      ? t('statement.contains', { list: names(statement.contains) })
      : t(statement.containsNone ? 'statement.containsNone' : 'statement.unknown')
  if (statement.mayContain.length === 0) return contains
  return `${contains} ${t('statement.mayContain', { list: names(statement.mayContain) })}`
}
