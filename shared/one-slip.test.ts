import fc from 'fast-check'
import { expect, test } from 'vitest'
import { isOneSlipApart } from './one-slip.ts'

test.each([
  ['4127', '4172', true],
  ['4127', '4271', false],
  ['4127', '4128', true],
  ['4127', '412', true],
  ['4127', '41277', true],
  ['4127', '4127', false],
  ['4127', '7127', true],
  ['4127', '1427', true],
  ['4127', '4138', false],
  ['4127', '1428', false],
  ['', '4', true],
  ['', '', false],
  ['4127', '41', false],
])('%s and %s: one slip apart is %s', (a, b, apart) => {
  expect(isOneSlipApart(a, b)).toBe(apart)
})

test('it does not matter which of the two is the slip, and any one slip is found', () => {
  const digits = fc.string({ unit: fc.constantFrom(...'0123456789'), minLength: 2, maxLength: 6 })
  fc.assert(
    fc.property(digits, digits, fc.nat(), fc.constantFrom(...'0123456789'), (code, other, at, digit) => {
      expect(isOneSlipApart(code, other)).toBe(isOneSlipApart(other, code))
      const place = at % code.length
      expect(isOneSlipApart(code, code.slice(0, place) + code.slice(place + 1))).toBe(true)
      expect(isOneSlipApart(code, code.slice(0, place) + digit + code.slice(place))).toBe(true)
      const wrong = code.slice(0, place) + digit + code.slice(place + 1)
      expect(isOneSlipApart(code, wrong)).toBe(wrong !== code)
      const left = at % (code.length - 1)
      const swapped = code.slice(0, left) + code[left + 1] + code[left] + code.slice(left + 2)
      expect(isOneSlipApart(code, swapped)).toBe(swapped !== code)
    }),
  )
})
