import { shareCents } from '../money.ts'

/**
 * How a drive treats sales tax. Rates are parts per million by tax category, so 6.35% is 63,500. Whether tax
 * is due at all is a question for the state revenue department or an adviser.
 */
export type TaxTerms =
  | { mode: 'none' }
  | { mode: 'added'; basis: 'order' | 'line'; ratesPpm: Record<string, number> }
  | { mode: 'included'; ratesPpm: Record<string, number> }

const MILLION = 1_000_000n

/**
 * Tax on an amount: computed to the third decimal of a dollar, rounded up when that decimal is above four.
 * Digits beyond the third are cut off and never round it (7.00 at 6.35% is 0.4445, which is 0.44).
 */
export function taxOn(amountCents: number, ratePpm: number): number {
  const tenths = (BigInt(amountCents) * BigInt(ratePpm) * 10n) / MILLION
  return tenthsToCents(tenths)
}

/** The tax that a price already holds: price × rate ÷ (1 + rate), rounded the same way. */
export function taxInside(priceCents: number, ratePpm: number): number {
  const tenths = (BigInt(priceCents) * BigInt(ratePpm) * 10n) / (MILLION + BigInt(ratePpm))
  return tenthsToCents(tenths)
}

function tenthsToCents(tenths: bigint): number {
  return Number(tenths / 10n + (tenths % 10n > 4n ? 1n : 0n))
}

export type TaxableLine = { amountCents: number; taxCategory: string }

/** Added tax of an order's lines, by the basis the terms choose; computed per order it is shared over the lines. */
export function taxLines(lines: readonly TaxableLine[], terms: TaxTerms): number[] {
  if (terms.mode !== 'added') return lines.map(() => 0)
  const rates = new Map(Object.entries(terms.ratesPpm))
  const rateOf = (line: TaxableLine) => rates.get(line.taxCategory) ?? 0
  if (terms.basis === 'line') return lines.map(line => taxOn(line.amountCents, rateOf(line)))
  const taxes = lines.map(() => 0)
  for (const rate of new Set(lines.map(rateOf))) {
    const places = lines.flatMap((line, place) => (rateOf(line) === rate ? [place] : []))
    const amounts = places.map(place => lines[place]!.amountCents)
    const tax = taxOn(
      amounts.reduce((sum, amount) => sum + amount, 0),
      rate,
    )
    shareCents(tax, amounts).forEach((part, i) => {
      taxes[places[i]!] = part
    })
  }
  return taxes
}
