import { type Messages, setupI18n } from '@lingui/core'
import type { Locale } from '../wire.ts'

/** Says a message by its key, with values filled in. */
export type Translate<Key extends string = string> = (key: Key, values?: Record<string, unknown>) => string

/**
 * A translator over compiled messages. A key without a message is a mistake of ours, and stops a test; a reader
 * sees the key rather than nothing.
 */
export function makeTranslator<Key extends string = string>(
  locale: Locale,
  messages: Messages,
): Translate<Key> {
  const i18n = setupI18n({ locale, messages: { [locale]: messages } })
  return (key, values) => unshield(i18n._(key, values && shieldValues(values)))
}

/** A character that is none, put between a typed backslash and the letter that would make it an escape. */
const BREAK = '\ufdd0'

/** The message library reads backslash-u in a finished sentence as an escape; what a person typed is none. */
function shieldValues(values: Record<string, unknown>): Record<string, unknown> {
  return Object.fromEntries(
    Object.entries(values).map(([name, value]) => [
      name,
      typeof value === 'string' ? value.replaceAll(BREAK, '').replace(/\\(?=[ux])/g, `\\${BREAK}`) : value,
    ]),
  )
}

function unshield(sentence: string): string {
  return sentence.replaceAll(BREAK, '')
}
