import { parseMoney } from '#shared/money.ts'
import { type PricedOrder, type PricingProblem, priceOrder } from '#shared/pricing/order-total.ts'
import type { StoreItem, StoreView } from '#shared/stores/contract.ts'
import type { Pad } from './pad.ts'

export type PadLine = { code: string; quantity: number; item: StoreItem | null }

export type PricedPad = {
  lines: PadLine[]
  /** Items on the pad that are no longer offered; pointed out, never dropped silently. */
  gone: PadLine[]
  giftCents: number
  giftIsWrong: boolean
  itemCount: number
  order: PricedOrder | null
  /** The order with and without covering the card fee, for saying what that costs. */
  coverCents: number
  problem: PricingProblem['code'] | null
}

/** The pad's quote, by the same rules as the server, which decides. */
export function pricePad(pad: Pad, view: StoreView): PricedPad {
  const byCode = new Map(view.items.map(item => [item.code, item]))
  const lines = pad.lines.map(line => ({ ...line, item: byCode.get(line.code) ?? null }))
  const offered = lines.filter(line => line.item?.available)
  const parsed = pad.gift.trim() === '' ? 0 : parseMoney(pad.gift)
  const giftCents = parsed ?? 0
  const quote = (coverFee: boolean) =>
    priceOrder({
      lines: offered.map(line => ({
        itemCode: line.code,
        quantity: line.quantity,
        unitPriceCents: line.item!.priceCents,
        taxCategory: line.item!.taxCategory,
      })),
      giftCents,
      coverFee,
      tax: view.drive.tax,
      fee: view.drive.cardFee,
      limits: view.drive.limits,
    })
  const asChosen = quote(pad.coverFee)
  const covered = quote(true)
  const { minGiftCents, maxGiftCents } = view.drive.limits
  return {
    lines,
    gone: lines.filter(line => !line.item?.available),
    giftCents,
    giftIsWrong: parsed === null || (parsed !== 0 && (parsed < minGiftCents || parsed > maxGiftCents)),
    itemCount: offered.reduce((sum, line) => sum + line.quantity, 0),
    order: asChosen.ok ? asChosen.order : null,
    coverCents: covered.ok ? covered.order.coverCents : 0,
    problem: asChosen.ok ? null : (asChosen.problems[0]?.code ?? null),
  }
}
