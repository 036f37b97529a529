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
      if (place === 7) return
      const swapped = plain.slice(0, place) + plain[place + 1] + plain[place] + plain.slice(place + 2)
      // The check character itself swapped with its neighbor may agree by chance; between letters of the body, never.
      if (place < 6) expect(isOrderNumber(swapped)).toBe(swapped === plain)
    }),
  )
})
