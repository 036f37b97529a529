import { roundHalfUp } from '../money.ts'

/** What the card service takes: a rate in basis points of the charge, and a fixed amount. */
export type FeeTerms = { rateBp: number; fixedCents: number }

/** The card service's fee on a charge; nothing on nothing. */
export function cardFee(chargeCents: number, terms: FeeTerms): number {
  if (chargeCents === 0) return 0
  return roundHalfUp(chargeCents * terms.rateBp, 10_000) + terms.fixedCents
}

export type CoveredCharge = { chargeCents: number; coverCents: number; feeCents: number }

/**
 * The smallest charge that leaves `netCents` after its own fee: what a customer pays who covers the fee.
 *
 * @throws RangeError for a rate of 100% or more, which no charge can cover.
 */
export function chargeToCover(netCents: number, terms: FeeTerms): CoveredCharge {
  if (netCents === 0) return { chargeCents: 0, coverCents: 0, feeCents: 0 }
  if (terms.rateBp >= 10_000) throw new RangeError('a fee of 100% or more cannot be covered')
  // Rounding takes at most half a cent off the fee, so the answer lies at or above this; from here it is a few steps.
  const least = Math.floor(((netCents + terms.fixedCents - 1) * 10_000) / (10_000 - terms.rateBp))
  let charge = Math.max(0, least - 1)
  while (charge - cardFee(charge, terms) < netCents) charge += 1
  return { chargeCents: charge, coverCents: charge - netCents, feeCents: cardFee(charge, terms) }
}
