/**
 * Order numbers are short, random and carry a check character, so that one read over the telephone is either
 * right or known to be wrong. They open nothing: the receipt address does.
 */
const ALPHABET = '0123456789ACDEFGHJKMNPQRTUVWXYZ'
const BASE = ALPHABET.length
const LENGTH = 7

/** A number from random bytes (at least seven), written `4K7A-2MX9`. */
export function makeOrderNumber(random: Uint8Array): string {
  if (random.length < LENGTH) throw new RangeError('an order number needs seven random bytes')
  const body = [...random.slice(0, LENGTH)].map(byte => ALPHABET[byte % BASE]).join('')
  return withHyphen(body + checkCharacter(body))
}

/** Whether a text is an order number that nobody misread: case, spaces and hyphens do not matter. */
export function isOrderNumber(text: string): boolean {
  const plain = text.toUpperCase().replace(/[\s-]/g, '')
  if (plain.length !== LENGTH + 1) return false
  if ([...plain].some(character => !ALPHABET.includes(character))) return false
  return checkCharacter(plain.slice(0, LENGTH)) === plain[LENGTH]
}

/** As it is stored, of what somebody typed. */
export function normalOrderNumber(text: string): string {
  return withHyphen(text.toUpperCase().replace(/[\s-]/g, ''))
}

/**
 * Weighted sum modulo the alphabet's length, which is prime: one wrong character, or two neighbors swapped,
 * always changes it.
 */
function checkCharacter(body: string): string {
  const sum = [...body].reduce(
    (total, character, place) => total + ALPHABET.indexOf(character) * (place + 2),
    0,
  )
  return ALPHABET[sum % BASE]!
}

function withHyphen(plain: string): string {
  return `${plain.slice(0, 4)}-${plain.slice(4)}`
}
