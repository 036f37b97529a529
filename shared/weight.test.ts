import fc from 'fast-check'
import { expect, test } from 'vitest'
import { formatWeight, GRAMS_PER_OUNCE, gramsToOunces, gramsToPounds, ouncesToGrams } from './weight.ts'

test('a pound is 453.59237 g and 43.2 oz are 1,224.699399 g (NIST Handbook 44, Appendix C; computed)', () => {
  expect(GRAMS_PER_OUNCE * 16).toBeCloseTo(453.59237, 8)
  expect(43.2 * GRAMS_PER_OUNCE).toBeCloseTo(1224.699399, 6)
  expect(36 * GRAMS_PER_OUNCE).toBeCloseTo(1020.5828325, 7)
  expect(48 * GRAMS_PER_OUNCE).toBeCloseTo(1360.77711, 5)
  expect(1000 / GRAMS_PER_OUNCE).toBeCloseTo(35.2739619496, 10)
  expect(gramsToPounds(1000)).toBeCloseTo(2.2046226218488, 12)
})

test('a converted weight never says more than is inside (from memory: the usual labeling rule)', () => {
  expect(ouncesToGrams(16)).toBe(453)
  expect(ouncesToGrams(43.2)).toBe(1224)
})

test('a converted weight is the largest that does not overstate', () => {
  fc.assert(
    fc.property(fc.integer({ min: 0, max: 1_000_000 }), thousandths => {
      const grams = ouncesToGrams(thousandths / 1000)
      expect(BigInt(grams) * 10n ** 12n <= BigInt(thousandths) * 28_349_523_125n).toBe(true)
      expect(BigInt(grams + 1) * 10n ** 12n > BigInt(thousandths) * 28_349_523_125n).toBe(true)
    }),
    { numRuns: 5_000 },
  )
  fc.assert(
    fc.property(fc.integer({ min: 0, max: 100_000 }), grams => {
      const tenths = BigInt(Math.round(gramsToOunces(grams) * 10))
      expect(tenths * 28_349_523_125n <= BigInt(grams) * 10n ** 10n).toBe(true)
      expect((tenths + 1n) * 28_349_523_125n > BigInt(grams) * 10n ** 10n).toBe(true)
    }),
  )
})

test('weights are shown as printed and in grams', () => {
  expect(formatWeight('2 tubs of 24 oz', 1360, 'en')).toBe('2 tubs of 24 oz (1,360 g)')
  expect(formatWeight('30 oz', 850, 'es')).toBe('30 oz (850 g)')
  expect(formatWeight(null, 850, 'en')).toBe('29.9 oz (850 g)')
})
