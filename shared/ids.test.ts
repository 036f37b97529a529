import fc from 'fast-check'
import { expect, test } from 'vitest'
import { isOrderNumber, makeOrderNumber, normalOrderNumber } from './ids.ts'

const bytes = fc.uint8Array({ minLength: 7, maxLength: 16 })
const ALPHABET = '0123456789ACDEFGHJKMNPQRTUVWXYZ'

test('every number made is a number, however it is typed', () => {
  fc.assert(
    fc.property(bytes, random => {
      const number = makeOrderNumber(random)
      expect(number).toMatch(/^[0-9A-Z]{4}-[0-9A-Z]{4}$/)
      expect(isOrderNumber(number)).toBe(true)
      expect(normalOrderNumber(` ${number.toLowerCase().replace('-', ' ')}`)).toBe(number)
    }),
  )
})

test('one wrong character or two neighbors swapped is always noticed', () => {
  fc.assert(
    fc.property(bytes, fc.nat(7), fc.nat(ALPHABET.length - 1), (random, place, other) => {
      const plain = makeOrderNumber(random).replace('-', '')
      const wrong = plain.slice(0, place) + ALPHABET[other] + plain.slice(place + 1)
      expect(isOrderNumber(wrong)).toBe(wrong === plain)
      const left = Math.min(place, 6)
      const swapped = plain.slice(0, left) + plain[left + 1] + plain[left] + plain.slice(left + 2)
      expect(isOrderNumber(swapped)).toBe(swapped === plain)
    }),
  )
})

test.each(['', '4K7A', '4K7A-2MX', '4K7A-2MX99', 'OOOO-OOOO', '４K7A-2MX9'])(
  '%j is no order number',
  text => {
    expect(isOrderNumber(text)).toBe(false)
  },
)

test('too little randomness is an error, not a weak number', () => {
  expect(() => makeOrderNumber(new Uint8Array(6))).toThrow(RangeError)
})
