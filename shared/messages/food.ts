import type { Locale } from '../wire.ts'
import { compileCatalog } from './compile-catalog.ts'
import foodEn from './food.en.json' with { type: 'json' }
import { makeTranslator, type Translate } from './translate.ts'

export type FoodKey = keyof typeof foodEn

const english = compileCatalog(foodEn)

/** The wording of allergens and storage, for the server and the mails; the browser gets it compiled beforehand. */
export function foodTranslator(locale: Locale): Translate {
  return makeTranslator(locale, english)
}
