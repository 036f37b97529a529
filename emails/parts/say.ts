import { compileCatalog } from '#shared/messages/compile-catalog.ts'
import { makeTranslator, type Translate } from '#shared/messages/translate.ts'
import type { Locale } from '#shared/wire.ts'
import english from '../locales/en.json' with { type: 'json' }

export type MailKey = keyof typeof english

const catalogs = { en: compileCatalog(english) }

/** The words of the mails in the reader's language; English where another is not written yet. */
export function mailTranslator(locale: Locale): Translate<MailKey> {
  return makeTranslator<MailKey>(locale, catalogs.en)
}

export type Mail = { subject: string; html: string; text: string }

/** A subject is one line, however a name in it was typed. */
export function oneLine(text: string): string {
  return text.replace(/\s+/g, ' ').trim()
}
