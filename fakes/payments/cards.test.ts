import { expect, test } from 'vitest'
import { cardOf, isCardNumber, luhnSum, mayBeShownAgain } from './cards.ts'

// ISO/IEC 7812-1, the check digit of card numbers: published numbers and their sums.
test.each([
  ['4242424242424242', 80],
  ['4242424242424241', 79],
  ['378282246310005', 60],
  ['5555555555554444', 60],
  ['6011111111111117', 30],
  ['79927398713', 70],
  ['79927398710', 67],
])('the digits of %s sum to %i', (number, sum) => {
  expect(luhnSum(number)).toBe(sum)
})

test('all zeros pass the sum and are still no card number', () => {
  expect(luhnSum('0000000000000000') % 10).toBe(0)
  expect(isCardNumber('0000000000000000')).toBe(false)
})

// The payment service's own testing page lists what each of these numbers does.
test.each([
  ['4000000000000002', 'declined', 'card_declined'],
  ['4000000000000341', 'declined', 'card_declined'],
  ['4000000000009995', 'insufficient_funds', 'card_declined'],
  ['4000000000000069', 'expired_card', 'expired_card'],
  ['4000000000000127', 'incorrect_cvc', 'incorrect_cvc'],
  ['4000000000000119', 'processing_error', 'processing_error'],
  ['4242424242424241', 'not_a_number', 'incorrect_number'],
  ['4539578763621486', 'not_a_test_card', 'card_declined'],
])('%s is refused: %s', (number, reason, code) => {
  expect(cardOf(number).decline).toMatchObject({ reason, code })
})

test.each([
  '4242424242424242',
  '4242 4242 4242 4242',
  '4242-4242-4242-4242',
  '4000000000000259',
  '378282246310005',
])('%s is accepted', number => {
  expect(cardOf(number)).toMatchObject({ decline: null, last4: number.slice(-4) })
})

test('a number that could be somebody’s card is never shown again', () => {
  expect(mayBeShownAgain('4539578763621486')).toBe(false)
  expect(mayBeShownAgain('4242 4242 4242 4241')).toBe(true)
  expect(mayBeShownAgain('4000000000000002')).toBe(true)
})
