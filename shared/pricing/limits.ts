/** Bounds of a single order. */
export type OrderLimits = {
  maxLineQuantity: number
  maxLines: number
  maxItems: number
  maxOrderCents: number
  minGiftCents: number
  maxGiftCents: number
}

export const DEFAULT_ORDER_LIMITS: OrderLimits = {
  maxLineQuantity: 99,
  maxLines: 60,
  maxItems: 200,
  maxOrderCents: 500_000,
  minGiftCents: 100,
  maxGiftCents: 100_000,
}
