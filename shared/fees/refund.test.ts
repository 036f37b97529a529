import fc from 'fast-check'
import { expect, test } from 'vitest'
import { type RefundableOrder, refundAmount } from './refund.ts'

/** 50.00 of goods, paid as 51.80 with the card fee covered: one line of 10.00, one of 2 × 20.00. */
function fiftyPaidAsFiftyOneEighty(): RefundableOrder {
  const line = (id: number, quantity: number, unitPriceCents: number) => ({
    id,
    quantity,
    unitPriceCents,
    taxCents: 0,
    refundedQuantity: 0,
    refundedCents: 0,
  })
  return {
    lines: [line(1, 1, 1000), line(2, 2, 2000)],
    giftCents: 0,
    coverCents: 180,
    totalCents: 5180,
    refundedCents: 0,
  }
}

test('one line of 10.00 gives back 10.00 and not the cover', () => {
  const refund = refundAmount({
    order: fiftyPaidAsFiftyOneEighty(),
    wanted: [{ lineId: 1, quantity: 1 }],
    everything: false,
  })
  expect(refund).toMatchObject({ ok: true, amountCents: 1000, coverCents: 0 })
})

test('all of it gives back 51.80, whether asked for as a whole or by the last lines', () => {
  const order = fiftyPaidAsFiftyOneEighty()
  const all = [
    { lineId: 1, quantity: 1 },
    { lineId: 2, quantity: 2 },
  ]
  expect(refundAmount({ order, wanted: all, everything: true })).toMatchObject({ amountCents: 5180 })
  expect(refundAmount({ order, wanted: all, everything: false })).toMatchObject({ amountCents: 5180 })
})

test('with a gift on the order, giving back every item leaves gift and cover', () => {
  const order = { ...fiftyPaidAsFiftyOneEighty(), giftCents: 500, totalCents: 5680 }
  const all = [
    { lineId: 1, quantity: 1 },
    { lineId: 2, quantity: 2 },
  ]
  expect(refundAmount({ order, wanted: all, everything: false })).toMatchObject({ amountCents: 5000 })
  expect(refundAmount({ order, wanted: all, everything: true })).toMatchObject({
    amountCents: 5680,
    giftCents: 500,
  })
})

test('everything that is left after a line of 10.00 is 41.80, and then nothing is left to give back', () => {
  const order = fiftyPaidAsFiftyOneEighty()
  order.lines[0] = { ...order.lines[0]!, refundedQuantity: 1, refundedCents: 1000 }
  order.refundedCents = 1000
  const rest = [{ lineId: 2, quantity: 2 }]
  expect(refundAmount({ order, wanted: rest, everything: true })).toMatchObject({ amountCents: 4180 })
  order.lines[1] = { ...order.lines[1]!, refundedQuantity: 2, refundedCents: 4000 }
  order.refundedCents = 5180
  expect(refundAmount({ order, wanted: [], everything: true })).toEqual({ ok: false })
})

test('"everything" that leaves a piece out is refused: the cover goes back only with all of it', () => {
  const wanted = [{ lineId: 1, quantity: 1 }]
  expect(refundAmount({ order: fiftyPaidAsFiftyOneEighty(), wanted, everything: true })).toEqual({
    ok: false,
  })
})

test('a line never gives back more than was paid for it, also when money went back without a piece', () => {
  const order = fiftyPaidAsFiftyOneEighty()
  order.lines[1] = { ...order.lines[1]!, refundedCents: 1000 }
  order.refundedCents = 1000
  const piece = (quantity: number) => ({ order, wanted: [{ lineId: 2, quantity }], everything: false })
  expect(refundAmount(piece(1))).toMatchObject({ ok: true, amountCents: 2000 })
  expect(refundAmount(piece(2))).toEqual({ ok: false })
})

test('a gift without items goes back as a whole', () => {
  const order = { lines: [], giftCents: 2000, coverCents: 91, totalCents: 2091, refundedCents: 0 }
  expect(refundAmount({ order, wanted: [], everything: true })).toMatchObject({ amountCents: 2091 })
  expect(refundAmount({ order, wanted: [], everything: false })).toEqual({ ok: false })
})

test.each([
  ['more than was bought', [{ lineId: 2, quantity: 3 }]],
  ['nothing', []],
  ['less than nothing', [{ lineId: 2, quantity: -1 }]],
  ['half a pie', [{ lineId: 2, quantity: 0.5 }]],
  ['a line of another order', [{ lineId: 99, quantity: 1 }]],
  [
    'one line twice',
    [
      { lineId: 2, quantity: 1 },
      { lineId: 2, quantity: 1 },
    ],
  ],
])('%s is refused', (_what, wanted) => {
  expect(refundAmount({ order: fiftyPaidAsFiftyOneEighty(), wanted, everything: false })).toEqual({
    ok: false,
  })
})

test('piece after piece, a line gives back exactly its price and its tax', () => {
  fc.assert(
    fc.property(
      fc.integer({ min: 1, max: 99 }),
      fc.integer({ min: 1, max: 3000 }),
      fc.integer({ min: 0, max: 500 }),
      (quantity, unitPriceCents, taxCents) => {
        const line = { id: 1, quantity, unitPriceCents, taxCents, refundedQuantity: 0, refundedCents: 0 }
        const order: RefundableOrder = {
          lines: [line],
          giftCents: 0,
          coverCents: 77,
          totalCents: quantity * unitPriceCents + taxCents + 77,
          refundedCents: 0,
        }
        while (line.refundedQuantity < quantity) {
          const refund = refundAmount({ order, wanted: [{ lineId: 1, quantity: 1 }], everything: false })
          if (!refund.ok) throw new Error('a piece was left and could not be given back')
          line.refundedQuantity += 1
          order.refundedCents += refund.amountCents
        }
        expect(order.refundedCents).toBe(order.totalCents)
      },
    ),
  )
})
