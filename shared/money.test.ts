import fc from 'fast-check'
import { expect, test } from 'vitest'
import { formatAmount, formatMoney, parseMoney, roundHalfUp, shareCents } from './money.ts'

test.each([
  [100, [1, 1, 1], [34, 33, 33]],
  [1001, [18, 18, 24], [300, 300, 401]],
  [7, [0, 5, 5, 5], [0, 3, 2, 2]],
  // Largest-remainder worked values, computed from the method itself.
  [10000, [1, 1, 1], [3334, 3333, 3333]],
  [100, [1, 1, 1, 1, 1, 1], [17, 17, 17, 17, 16, 16]],
  [4001, [1850, 2200, 1600, 950], [1121, 1334, 970, 576]],
  [10, [6, 6, 2], [4, 4, 2]],
  [11, [6, 6, 2], [5, 5, 1]],
  [5, [0, 0], [3, 2]],
])('%i cents over %j are %j', (total, weights, parts) => {
  expect(shareCents(total, weights)).toEqual(parts)
})

test('shares always add up, and none is a whole cent away from its quota', () => {
  const weights = fc.array(fc.integer({ min: 0, max: 1_000_000 }), { minLength: 1, maxLength: 60 })
  fc.assert(
    fc.property(fc.integer({ min: 0, max: 500_000_000 }), weights, (total, w) => {
      const parts = shareCents(total, w)
      expect(parts.reduce((a, b) => a + b, 0)).toBe(total)
      const sum = w.reduce((a, b) => a + b, 0)
      // Times the sum of the weights, a cent is that sum: compared in whole numbers, nothing is blurred.
      if (sum > 0)
        parts.forEach((part, i) => {
          const off = BigInt(part) * BigInt(sum) - BigInt(total) * BigInt(w[i]!)
          expect(off < BigInt(sum) && -off < BigInt(sum)).toBe(true)
        })
    }),
  )
})

test.each([
  ['5', 500],
  ['5.5', 550],
  ['5.00', 500],
  ['1,000.00', 100_000],
  ['$12.34', 1234],
  // Floating point would make 1998.9999… and 114.9999… of these.
  ['19.99', 1999],
  ['999,999,999.99', 99_999_999_999],
  ['1.15', 115],
  ['4.35', 435],
])('"%s" typed is %i cents', (text, cents) => {
  expect(parseMoney(text)).toBe(cents)
})

test.each([
  '',
  '0.001',
  '1e-7',
  '-5',
  '5,00',
  '٥',
  '５',
  '5.005',
  '1,00',
  '0,500',
  'abc',
  '5.',
  '.5',
  '99999999',
  '9,007,199,254,740,993.00',
])('"%s" is no amount', text => {
  expect(parseMoney(text)).toBeNull()
})

test('what is written as an amount is read as the same amount', () => {
  fc.assert(
    fc.property(fc.integer({ min: 0, max: 99_999_999_999 }), cents => {
      expect(parseMoney(formatAmount(cents, 'en'))).toBe(cents)
      expect(parseMoney(formatMoney(cents, { locale: 'en', currency: 'usd' }))).toBe(cents)
    }),
  )
})

test('shares of the largest whole numbers are exact', () => {
  expect(shareCents(9_007_199_254_740_991, [1, 1])).toEqual([4_503_599_627_370_496, 4_503_599_627_370_495])
  expect(shareCents(9_007_199_254_740_991, [9_007_199_254_740_991, 0])).toEqual([9_007_199_254_740_991, 0])
})

test('what has no meaning is an error, not a number', () => {
  expect(() => shareCents(-1, [1, 1])).toThrow(RangeError)
  expect(() => shareCents(1, [2, -1])).toThrow(RangeError)
  expect(() => shareCents(1.5, [1, 1])).toThrow(RangeError)
  expect(() => roundHalfUp(-5, 10)).toThrow(RangeError)
  expect(() => roundHalfUp(5, 0)).toThrow(RangeError)
})

test('a half is rounded up, exactly, at any size', () => {
  expect(roundHalfUp(5, 10)).toBe(1)
  expect(roundHalfUp(4, 10)).toBe(0)
  expect(roundHalfUp(15n * 10n ** 15n, 10n ** 16n)).toBe(2)
})

test('money reads as its readers write it', () => {
  expect(formatMoney(5700, { locale: 'en', currency: 'usd' })).toBe('$57.00')
  expect(formatMoney(5700, { locale: 'es', currency: 'usd' })).toBe('$57.00')
  expect(formatAmount(123456, 'en')).toBe('1,234.56')
})
