import { expect, test } from 'vitest'
import { formatWeight, GRAMS_PER_OUNCE, ouncesToGrams } from './weight.ts'

test('a pound is 453.59237 g and 43.2 oz are 1,224.699399 g (NIST Handbook 44, Appendix C; computed)', () => {
  expect(GRAMS_PER_OUNCE * 16).toBeCloseTo(453.59237, 8)
  expect(43.2 * GRAMS_PER_OUNCE).toBeCloseTo(1224.699399, 6)
})

test('a converted weight never says more than is inside (from memory: the usual labeling rule)', () => {
  expect(ouncesToGrams(16)).toBe(453)
  expect(ouncesToGrams(43.2)).toBe(1224)
})

test('weights are shown as printed and in grams', () => {
  expect(formatWeight('2 tubs of 24 oz', 1360, 'en')).toBe('2 tubs of 24 oz (1,360 g)')
})
