import type { Locale } from './wire.ts'

/** Whole cents. Money is never a fraction and never floating point. */
export type Cents = number

const tags: Record<Locale, string> = { en: 'en-US', es: 'es-US' }

/** "$57.00", in the reader's language. */
export function formatMoney(cents: Cents, options: { locale: Locale; currency: string }): string {
  return new Intl.NumberFormat(tags[options.locale], {
    style: 'currency',
    currency: options.currency.toUpperCase(),
  }).format(cents / 100)
}

/** "57.00", for columns that say once what they hold. */
export function formatAmount(cents: Cents, locale: Locale): string {
  return new Intl.NumberFormat(tags[locale], { minimumFractionDigits: 2, maximumFractionDigits: 2 }).format(
    cents / 100,
  )
}

/**
 * Cents of an amount somebody typed, such as "5", "5.5", "5.00" or "1,000.00"; null for anything else: more
 * than two decimals, a sign, an exponent, a decimal comma, digits of other scripts, a billion or more.
 */
export function parseMoney(text: string): Cents | null {
  const match = /^([1-9]\d{0,2}(?:,\d{3}){1,2}|\d{1,7})(?:\.(\d{1,2}))?$/.exec(
    text.trim().replace(/^\$\s?/, ''),
  )
  if (!match) return null
  return Number(match[1]!.replaceAll(',', '')) * 100 + Number((match[2] ?? '').padEnd(2, '0'))
}

/**
 * Numerator ÷ denominator for whole non-negative numbers, a half rounded up; exact at any size.
 *
 * @throws RangeError for a fraction, a negative numerator or a denominator that is not positive.
 */
export function roundHalfUp(numerator: bigint | number, denominator: bigint | number): number {
  const n = BigInt(numerator)
  const d = BigInt(denominator)
  if (n < 0n || d <= 0n) throw new RangeError('only whole non-negative numbers are rounded here')
  return Number((2n * n + d) / (2n * d))
}

/**
 * Shares an amount over weights so that the parts add up exactly: each gets the whole cents of its quota, the
 * cents left over go to the largest remainders, a tie to the earlier place (Hamilton's method). With no weight
 * at all everybody weighs the same.
 *
 * @throws RangeError for an amount or a weight that is negative or not whole.
 */
export function shareCents(total: Cents, weights: readonly number[]): Cents[] {
  if (total < 0 || weights.some(weight => weight < 0)) throw new RangeError('shares are never negative')
  if (weights.length === 0) return []
  const sum = weights.reduce((all, weight) => all + BigInt(weight), 0n)
  if (sum === 0n)
    return shareCents(
      total,
      weights.map(() => 1),
    )
  const quotas = weights.map(weight => BigInt(total) * BigInt(weight))
  const parts = quotas.map(quota => quota / sum)
  const left = Number(BigInt(total) - parts.reduce((all, part) => all + part, 0n))
  const byRemainder = quotas
    .map((quota, place) => ({ place, remainder: quota % sum }))
    .sort((a, b) => (a.remainder === b.remainder ? a.place - b.place : a.remainder > b.remainder ? -1 : 1))
  for (const { place } of byRemainder.slice(0, left)) parts[place] = parts[place]! + 1n
  return parts.map(Number)
}
