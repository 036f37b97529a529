/** What the documented test numbers do. `decline` holds the service's own code for the reason. */
export type Card = {
  brand: string
  last4: string
  decline: null | { code: string; declineCode: string; reason: DeclineReason }
}

export type DeclineReason =
  | 'declined'
  | 'insufficient_funds'
  | 'expired_card'
  | 'incorrect_cvc'
  | 'processing_error'
  | 'not_a_number'
  | 'not_a_test_card'

const accepted = (brand: string) => ({ brand, decline: null })
const declined = (reason: DeclineReason, code: string, declineCode: string) => ({
  brand: 'visa',
  decline: { code, declineCode, reason },
})

/** The payment service's published test numbers. No other number is taken here: it might be somebody's card. */
const TEST_CARDS: Record<string, Omit<Card, 'last4'>> = {
  '4242424242424242': accepted('visa'),
  '4000056655665556': accepted('visa'),
  '5555555555554444': accepted('mastercard'),
  '378282246310005': accepted('amex'),
  '6011111111111117': accepted('discover'),
  '4000000000000259': accepted('visa'),
  '4000000000000002': declined('declined', 'card_declined', 'generic_decline'),
  '4000000000000341': declined('declined', 'card_declined', 'generic_decline'),
  '4000000000009995': declined('insufficient_funds', 'card_declined', 'insufficient_funds'),
  '4000000000000069': declined('expired_card', 'expired_card', 'expired_card'),
  '4000000000000127': declined('incorrect_cvc', 'incorrect_cvc', 'incorrect_cvc'),
  '4000000000000119': declined('processing_error', 'processing_error', 'processing_error'),
}

/** Looks a typed number up. Spaces and hyphens between the digits are the customer's own and do not count. */
export function cardOf(typed: string): Card {
  const number = digitsOf(typed)
  const refused = (reason: DeclineReason, code: string, declineCode: string): Card => ({
    brand: 'unknown',
    last4: number.slice(-4),
    decline: { code, declineCode, reason },
  })
  if (!isCardNumber(number)) return refused('not_a_number', 'incorrect_number', 'incorrect_number')
  const known = TEST_CARDS[number]
  if (!known) return refused('not_a_test_card', 'card_declined', 'test_mode_live_card')
  return { ...known, last4: number.slice(-4) }
}

/** Whether a number may be shown again in a form: a published test number, or one that is no card number at all. */
export function mayBeShownAgain(typed: string): boolean {
  const number = digitsOf(typed)
  return number in TEST_CARDS || !isCardNumber(number)
}

/** The check digit of ISO/IEC 7812-1, over 12 to 19 digits; all zeros would pass it and are refused. */
export function isCardNumber(number: string): boolean {
  if (!/^\d{12,19}$/.test(number) || /^0+$/.test(number)) return false
  return luhnSum(number) % 10 === 0
}

/** From the right, every second digit doubled, nine taken off what then has two digits. */
export function luhnSum(digits: string): number {
  let sum = 0
  for (let place = 0; place < digits.length; place++) {
    const digit = Number(digits[digits.length - 1 - place])
    const counted = place % 2 === 0 ? digit : digit * 2
    sum += counted > 9 ? counted - 9 : counted
  }
  return sum
}

function digitsOf(typed: string): string {
  return typed.replace(/[\s-]/g, '')
}
