import { compileCatalog } from '#shared/messages/compile-catalog.ts'
import { foodTranslator } from '#shared/messages/food.ts'
import { makeTranslator, type Translate } from '#shared/messages/translate.ts'
import type { Locale } from '#shared/wire.ts'
import english from '../locales/en.json' with { type: 'json' }
import { isolated } from './literal.ts'

export type Mail = { subject: string; html: string; text: string }

export type MailKey = keyof typeof english

export type Words = {
  /** The language the mail is written in: the reader's, or English until theirs is there. */
  locale: Locale
  t: Translate<MailKey>
  /** Allergens and storage, in the words they have on every screen. */
  food: Translate
}

/** Languages the mails are written in. A second one is a second file, named here. */
const written: Partial<Record<Locale, Record<MailKey, string>>> = { en: english }

const spoken = new Map<Locale, Words>()

/**
 * The words of a mail. Dates and amounts follow the same language, so that no mail is half in one and half in
 * another. What people typed stays literal in every sentence.
 */
export function wordsFor(wanted: Locale): Words {
  const locale = written[wanted] ? wanted : 'en'
  const known = spoken.get(locale)
  if (known) return known
  const say = makeTranslator<MailKey>(locale, compileCatalog(written[locale] ?? english))
  const words: Words = {
    locale,
    t: (key, values) => say(key, values && literalValues(values)),
    food: foodTranslator(locale),
  }
  spoken.set(locale, words)
  return words
}

function literalValues(values: Record<string, unknown>): Record<string, unknown> {
  return Object.fromEntries(
    Object.entries(values).map(([name, value]) => [
      name,
      typeof value === 'string' ? isolated(value) : value,
    ]),
  )
}
