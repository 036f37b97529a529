import { cardFee, chargeToCover, type FeeTerms } from '../fees/card-fee.ts'
import { type TaxTerms, taxLines } from '../tax/sales-tax.ts'
import type { OrderLimits } from './limits.ts'

export type PricingLine = { itemCode: string; quantity: number; unitPriceCents: number; taxCategory: string }

export type PricingRequest = {
  lines: readonly PricingLine[]
  giftCents: number
  coverFee: boolean
  tax: TaxTerms
  fee: FeeTerms
  limits: OrderLimits
}

export type PricedLine = PricingLine & { amountCents: number; taxCents: number }

export type PricedOrder = {
  lines: PricedLine[]
  itemCount: number
  itemsCents: number
  giftCents: number
  taxCents: number
  /** What the customer adds so that the card fee costs the organization nothing. */
  coverCents: number
  totalCents: number
  /** The card fee on the total, by the terms. */
  feeCents: number
}

export type PricingProblem = {
  path: string
  code:
    | 'empty_order'
    | 'too_many_lines'
    | 'too_many_items'
    | 'quantity_out_of_range'
    | 'order_too_large'
    | 'gift_out_of_range'
}

/**
 * The price of an order: items, gift, tax and fee cover, in cents. Prices are those of the drive's frozen
 * catalog; whoever calls brings them. A gift is no item and is not taxed.
 */
export function priceOrder(
  request: PricingRequest,
): { ok: true; order: PricedOrder } | { ok: false; problems: PricingProblem[] } {
  const { limits, giftCents } = request
  const problems = findProblems(request)
  if (problems.length > 0) return { ok: false, problems }

  const amounts = request.lines.map(line => ({ ...line, amountCents: line.quantity * line.unitPriceCents }))
  const taxes = taxLines(amounts, request.tax)
  const lines = amounts.map((line, place) => ({ ...line, taxCents: taxes[place] ?? 0 }))
  const itemsCents = sum(lines.map(line => line.amountCents))
  const taxCents = sum(taxes)
  const net = itemsCents + giftCents + taxCents
  const coverCents = request.coverFee ? chargeToCover(net, request.fee).coverCents : 0
  const totalCents = net + coverCents
  if (totalCents > limits.maxOrderCents)
    return { ok: false, problems: [{ path: 'lines', code: 'order_too_large' }] }
  return {
    ok: true,
    order: {
      lines,
      itemCount: sum(lines.map(line => line.quantity)),
      itemsCents,
      giftCents,
      taxCents,
      coverCents,
      totalCents,
      feeCents: cardFee(totalCents, request.fee),
    },
  }
}

function findProblems({ lines, giftCents, limits }: PricingRequest): PricingProblem[] {
  const problems: PricingProblem[] = []
  if (lines.length === 0 && giftCents === 0) problems.push({ path: 'lines', code: 'empty_order' })
  if (lines.length > limits.maxLines) problems.push({ path: 'lines', code: 'too_many_lines' })
  lines.forEach((line, place) => {
    if (!Number.isInteger(line.quantity) || line.quantity < 1 || line.quantity > limits.maxLineQuantity)
      problems.push({ path: `lines.${place}.quantity`, code: 'quantity_out_of_range' })
  })
  if (sum(lines.map(line => line.quantity)) > limits.maxItems)
    problems.push({ path: 'lines', code: 'too_many_items' })
  const giftFits =
    giftCents === 0 ||
    (Number.isInteger(giftCents) && giftCents >= limits.minGiftCents && giftCents <= limits.maxGiftCents)
  if (!giftFits) problems.push({ path: 'giftCents', code: 'gift_out_of_range' })
  return problems
}

function sum(numbers: readonly number[]): number {
  return numbers.reduce((total, n) => total + n, 0)
}
