import { roundHalfUp } from '../money.ts'

/** What the card service takes: a rate in basis points of the charge, and a fixed amount. */
export type FeeTerms = { rateBp: number; fixedCents: number }

/** The card service's fee on a charge; nothing on nothing. */
export function cardFee(chargeCents: number, terms: FeeTerms): number {
  if (chargeCents === 0) return 0
  return roundHalfUp(chargeCents * terms.rateBp, 10_000) + terms.fixedCents
}

export type CoveredCharge = { chargeCents: number; coverCents: number; feeCents: number }

/** The smallest charge that leaves `netCents` after its own fee: what a customer pays who covers the fee. */
export function chargeToCover(netCents: number, terms: FeeTerms): CoveredCharge {
  if (netCents === 0) return { chargeCents: 0, coverCents: 0, feeCents: 0 }
  let charge = Math.max(0, Math.floor(((netCents + terms.fixedCents) * 10_000) / (10_000 - terms.rateBp)) - 2)
  while (charge - cardFee(charge, terms) < netCents) charge += 1
  return { chargeCents: charge, coverCents: charge - netCents, feeCents: cardFee(charge, terms) }
}
