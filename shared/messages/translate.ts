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
  return (key, values) => i18n._(key, values)
}
