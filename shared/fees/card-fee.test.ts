import fc from 'fast-check'
import { expect, test } from 'vitest'
import { cardFee, chargeToCover } from './card-fee.ts'

const demo = { rateBp: 290, fixedCents: 30 }

test.each([
  [2000, 2091, 91],
  [5000, 5180, 180],
  [12345, 12745, 400],
  [100, 134, 34],
  [0, 0, 0],
])('to leave %i cents the customer pays %i, of which %i are the fee', (net, charge, fee) => {
  expect(chargeToCover(net, demo)).toEqual({ chargeCents: charge, coverCents: charge - net, feeCents: fee })
})

test('the covered charge is enough, and one cent less always falls short', () => {
  const terms = fc.record({
    rateBp: fc.integer({ min: 0, max: 9_500 }),
    fixedCents: fc.integer({ min: 0, max: 100 }),
  })
  fc.assert(
    fc.property(fc.integer({ min: 1, max: 600_000 }), terms, (net, fee) => {
      const { chargeCents } = chargeToCover(net, fee)
      expect(chargeCents - cardFee(chargeCents, fee)).toBeGreaterThanOrEqual(net)
      expect(chargeCents - 1 - cardFee(chargeCents - 1, fee)).toBeLessThan(net)
    }),
  )
})

test('the covered charge is the smallest of all that are enough', () => {
  for (let net = 1; net <= 3_000; net += 7) {
    const smallest = Array.from({ length: net * 2 + 100 }, (_, c) => c).find(c => c - cardFee(c, demo) >= net)
    expect(chargeToCover(net, demo).chargeCents).toBe(smallest)
  }
})

test('a fee of the whole charge cannot be covered', () => {
  expect(() => chargeToCover(1000, { rateBp: 10_000, fixedCents: 30 })).toThrow(RangeError)
})
