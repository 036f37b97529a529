import fc from 'fast-check'
import { expect, test } from 'vitest'
import { DEFAULT_ORDER_LIMITS } from './limits.ts'
import { type PricingRequest, priceOrder } from './order-total.ts'

function aRequest(changes: Partial<PricingRequest> = {}): PricingRequest {
  return {
    lines: [{ itemCode: '1204', quantity: 2, unitPriceCents: 1600, taxCategory: 'food' }],
    giftCents: 0,
    coverFee: false,
    tax: { mode: 'none' },
    fee: { rateBp: 290, fixedCents: 30 },
    limits: DEFAULT_ORDER_LIMITS,
    ...changes,
  }
}

const lineOf = (quantity: number, unitPriceCents = 1000) => ({
  itemCode: '1204',
  quantity,
  unitPriceCents,
  taxCategory: 'food',
})

test('two chowders and a gift of 5.00', () => {
  const priced = priceOrder(aRequest({ giftCents: 500 }))
  expect(priced).toMatchObject({
    ok: true,
    order: { itemsCents: 3200, giftCents: 500, taxCents: 0, coverCents: 0, totalCents: 3700, itemCount: 2 },
  })
})

test('a gift alone is an order', () => {
  expect(priceOrder(aRequest({ lines: [], giftCents: 2000, coverFee: true }))).toMatchObject({
    ok: true,
    order: { totalCents: 2091, coverCents: 91, feeCents: 91, itemCount: 0 },
  })
})

test('a gift is not taxed, and the cover covers the fee on the tax as well', () => {
  const priced = priceOrder(
    aRequest({
      lines: [lineOf(1, 1050)],
      giftCents: 1000,
      tax: { mode: 'added', basis: 'order', ratesPpm: { food: 70_000 } },
      coverFee: true,
    }),
  )
  if (!priced.ok) throw new Error('should be priced')
  expect(priced.order.taxCents).toBe(74)
  expect(priced.order.totalCents - priced.order.feeCents).toBeGreaterThanOrEqual(1050 + 1000 + 74)
})

test.each([
  ['nothing at all', { lines: [] }, 'empty_order'],
  ['a quantity of 0', { lines: [lineOf(0)] }, 'quantity_out_of_range'],
  ['a quantity of 100', { lines: [lineOf(100, 1)] }, 'quantity_out_of_range'],
  ['a quantity of 1.5', { lines: [lineOf(1.5)] }, 'quantity_out_of_range'],
  ['61 lines', { lines: Array.from({ length: 61 }, () => lineOf(1)) }, 'too_many_lines'],
  ['201 items', { lines: [lineOf(99, 1), lineOf(99, 1), lineOf(3, 1)] }, 'too_many_items'],
  ['more than 5,000.00', { lines: [lineOf(99, 5051)] }, 'order_too_large'],
  ['a gift of 0.99', { giftCents: 99 }, 'gift_out_of_range'],
  ['a gift of 1,000.01', { giftCents: 100_001 }, 'gift_out_of_range'],
])('%s is refused', (_what, changes, code) => {
  const priced = priceOrder(aRequest(changes))
  expect(priced).toMatchObject({ ok: false, problems: [{ code }] })
})

test.each([
  ['99 of one item', { lines: [lineOf(99, 1)] }],
  ['60 lines', { lines: Array.from({ length: 60 }, () => lineOf(1)) }],
  ['200 items', { lines: [lineOf(99, 1), lineOf(99, 1), lineOf(2, 1)] }],
  ['exactly 5,000.00', { lines: [lineOf(50, 10_000)] }],
  ['a gift of 1.00', { giftCents: 100 }],
  ['a gift of 1,000.00', { giftCents: 100_000 }],
])('%s is taken', (_what, changes) => {
  expect(priceOrder(aRequest(changes)).ok).toBe(true)
})

test('the total is the sum of its parts, and the lines sum up to the items and the tax', () => {
  const line = fc.record({
    itemCode: fc.constant('1204'),
    quantity: fc.integer({ min: 1, max: 10 }),
    unitPriceCents: fc.integer({ min: 1, max: 2_000 }),
    taxCategory: fc.constantFrom('food', 'sweets'),
  })
  const basis = fc.constantFrom('order' as const, 'line' as const)
  fc.assert(
    fc.property(
      fc.array(line, { minLength: 1, maxLength: 20 }),
      basis,
      fc.boolean(),
      (lines, chosen, coverFee) => {
        const priced = priceOrder(
          aRequest({
            lines,
            coverFee,
            giftCents: 300,
            tax: { mode: 'added', basis: chosen, ratesPpm: { food: 62_500, sweets: 79_750 } },
          }),
        )
        if (!priced.ok) throw new Error('should be priced')
        const { order } = priced
        expect(order.totalCents).toBe(order.itemsCents + order.giftCents + order.taxCents + order.coverCents)
        expect(order.lines.reduce((all, l) => all + l.amountCents, 0)).toBe(order.itemsCents)
        expect(order.lines.reduce((all, l) => all + l.taxCents, 0)).toBe(order.taxCents)
      },
    ),
  )
})
