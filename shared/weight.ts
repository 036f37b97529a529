import type { Locale } from './wire.ts'

/** Grams in an avoirdupois ounce (exact by definition). */
export const GRAMS_PER_OUNCE = 28.349523125

/** Whole grams of a weight in ounces, rounded down so that a label never says more than is inside. */
export function ouncesToGrams(ounces: number): number {
  return Math.floor(Math.round(ounces * GRAMS_PER_OUNCE * 1e6) / 1e6)
}

/** "24 oz (680 g)": the weight as the package prints it, and in grams. */
export function formatWeight(printed: string, grams: number, locale: Locale): string {
  const metric = new Intl.NumberFormat(locale === 'es' ? 'es-US' : 'en-US').format(grams)
  return `${printed} (${metric} g)`
}
