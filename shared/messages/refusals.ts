import { compileCatalog } from './compile-catalog.ts'
import english from './refusals.en.json' with { type: 'json' }
import { makeTranslator } from './translate.ts'

export type RefusalKey = keyof typeof english

const say = makeTranslator<RefusalKey>('en', compileCatalog(english))

/** The sentence of a refusal, from the catalog: what happened, what was kept, what to do. */
export function refusal(key: RefusalKey, values?: Record<string, unknown>): string {
  return say(key, values)
}
