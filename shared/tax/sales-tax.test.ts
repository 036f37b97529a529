import fc from 'fast-check'
import { expect, test } from 'vitest'
import { taxInside, taxLines, taxOn } from './sales-tax.ts'

test.each([
  [1050, 70_000, 74],
  [1999, 62_500, 125],
  [1000, 72_500, 73],
  [50, 70_000, 4],
  // Streamlined Sales and Use Tax Agreement, section 324 A, as adopted in R.I. 44-18.1-25 and K.S.A. 79-3676.
  [1800, 62_500, 113],
  [700, 63_500, 44],
  [2200, 79_750, 175],
  // Section 324 B, aggregated rate: 4.75% and 2.25% together.
  [1800, 70_000, 126],
  // The same taken apart: 0.86 and 0.41, a cent more.
  [1800, 47_500, 86],
  [1800, 22_500, 41],
  [0, 70_000, 0],
  [500_000, 0, 0],
])('%i cents at %i ppm bear %i cents of tax', (amount, rate, tax) => {
  expect(taxOn(amount, rate)).toBe(tax)
})

test.each([
  [1800, 62_500, 106],
  [2000, 70_000, 131],
])('a price of %i cents at %i ppm holds %i cents of tax', (price, rate, tax) => {
  expect(taxInside(price, rate)).toBe(tax)
})

test('per line or per order, as the seller of record elects (section 324 B)', () => {
  const three = Array.from({ length: 3 }, () => ({ amountCents: 1850, taxCategory: 'food' }))
  const sum = (taxes: number[]) => taxes.reduce((a, b) => a + b, 0)
  const ratesPpm = { food: 63_500 }
  expect(sum(taxLines(three, { mode: 'added', basis: 'line', ratesPpm }))).toBe(351)
  expect(sum(taxLines(three, { mode: 'added', basis: 'order', ratesPpm }))).toBe(352)
  const four = Array.from({ length: 4 }, () => ({ amountCents: 1700, taxCategory: 'food' }))
  expect(sum(taxLines(four, { mode: 'added', basis: 'line', ratesPpm: { food: 55_000 } }))).toBe(376)
  expect(sum(taxLines(four, { mode: 'added', basis: 'order', ratesPpm: { food: 55_000 } }))).toBe(374)
})

test('tax is the nearest cent, the higher on a tie, and never falls when the amount grows', () => {
  fc.assert(
    fc.property(
      fc.integer({ min: 0, max: 500_000 }),
      fc.integer({ min: 0, max: 150_000 }),
      (amount, rate) => {
        // Half-up says it without decimals: 2 × tax is within one of 2 × the exact value, above on a tie.
        const off = 2 * taxOn(amount, rate) * 1_000_000 - 2 * amount * rate
        expect(off).toBeGreaterThan(-1_000_000)
        expect(off).toBeLessThanOrEqual(1_000_000)
        expect(taxOn(amount + 1, rate)).toBeGreaterThanOrEqual(taxOn(amount, rate))
      },
    ),
  )
})

test('nothing is added when tax is not collected or already inside the price', () => {
  const lines = [{ amountCents: 1800, taxCategory: 'food' }]
  expect(taxLines(lines, { mode: 'none' })).toEqual([0])
  expect(taxLines(lines, { mode: 'included', ratesPpm: { food: 62_500 } })).toEqual([0])
})

test('the tax inside a price is the tax that its bare part bears, to the cent', () => {
  fc.assert(
    fc.property(fc.integer({ min: 0, max: 500_000 }), fc.integer({ min: 0, max: 150_000 }), (price, rate) => {
      const inside = taxInside(price, rate)
      expect(Math.abs(taxOn(price - inside, rate) - inside)).toBeLessThanOrEqual(1)
      expect(inside).toBeLessThanOrEqual(taxOn(price, rate))
    }),
  )
})

test('tax of an order is shared over the lines of its rate alone, and sums up to the cent', () => {
  const line = (amountCents: number, taxCategory: string) => ({ amountCents, taxCategory })
  const lines = [line(1850, 'sweets'), line(1000, 'food'), line(1850, 'sweets'), line(1850, 'sweets')]
  const terms = { mode: 'added', basis: 'order', ratesPpm: { sweets: 63_500 } } as const
  // 55.50 at 6.35% bears 3.52, over three equal lines: 1.18, 1.17, 1.17. No rate for food: no tax on it.
  expect(taxLines(lines, terms)).toEqual([118, 0, 117, 117])
})

test('a category that no rate names bears no tax, whatever it is called', () => {
  const terms = { mode: 'added', basis: 'line', ratesPpm: { food: 70_000 } } as const
  expect(taxLines([{ amountCents: 1000, taxCategory: 'constructor' }], terms)).toEqual([0])
})
