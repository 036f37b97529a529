import { randomInt } from 'node:crypto'

/** No letter that is mistaken for a digit or another letter when copied from paper. */
const LETTERS = 'ABCDEFGHJKMNPQRSTVWXYZ23456789'

/** Ten codes to print, of ten characters each: 49 random bits, and wrong ones lock. */
export function makeRecoveryCodes(): string[] {
  const letters = () => Array.from({ length: 5 }, () => LETTERS[randomInt(LETTERS.length)]).join('')
  return Array.from({ length: 10 }, () => `${letters()}-${letters()}`)
}

/** A recovery code as somebody typed it, in the form it was printed. */
export function tidyRecoveryCode(typed: string): string {
  const letters = typed.toUpperCase().replaceAll(/[^A-Z0-9]/g, '')
  return letters.length === 10 ? `${letters.slice(0, 5)}-${letters.slice(5)}` : typed.slice(0, 40)
}
