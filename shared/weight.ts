import type { Locale } from './wire.ts'

/** Grams in an avoirdupois ounce (exact by definition). */
export const GRAMS_PER_OUNCE = 28.349523125
const BILLIONTHS_PER_OUNCE = 28_349_523_125n
const OUNCES_PER_POUND = 16

/**
 * Whole grams of a weight in ounces (labels give at most three decimals), rounded down so that a label never
 * says more than is inside.
 */
export function ouncesToGrams(ounces: number): number {
  const thousandths = BigInt(Math.round(ounces * 1_000))
  return Number((thousandths * BILLIONTHS_PER_OUNCE) / 1_000_000_000_000n)
}

/** Tenths of an ounce in whole grams, rounded down for the same reason. */
export function gramsToOunces(grams: number): number {
  return Number((BigInt(grams) * 10_000_000_000n) / BILLIONTHS_PER_OUNCE) / 10
}

export function gramsToPounds(grams: number): number {
  return grams / (GRAMS_PER_OUNCE * OUNCES_PER_POUND)
}

/** "24 oz (680 g)": the weight as the package prints it, or worked out where it prints none, and in grams. */
export function formatWeight(printed: string | null, grams: number, locale: Locale): string {
  const tag = locale === 'es' ? 'es-US' : 'en-US'
  const ounces = printed ?? `${new Intl.NumberFormat(tag).format(gramsToOunces(grams))} oz`
  return `${ounces} (${new Intl.NumberFormat(tag).format(grams)} g)`
}
