import { createHmac, timingSafeEqual } from 'node:crypto'

/** How long one code lasts, in ms (RFC 6238, section 5.2: the recommended time step). */
export const STEP_MS = 30_000

/** The time step an instant falls into. */
export function stepAt(at: number): number {
  return Math.floor(at / STEP_MS)
}

/**
 * The code of one time step, as an authenticator app shows it: HMAC-SHA-1 over the step's number, cut down
 * as in RFC 4226, section 5.3.
 */
export function codeOf(secret: string, step: number, digits = 6): string {
  const counter = Buffer.alloc(8)
  counter.writeBigUInt64BE(BigInt(step))
  const digest = createHmac('sha1', secret).update(counter).digest()
  const offset = digest.at(-1)! & 15
  const number = digest.readUInt32BE(offset) & 0x7fffffff
  return String(number % 10 ** digits).padStart(digits, '0')
}

/** The step whose code this is: now's, or one to either side for a phone that is a little off; else null. */
export function matchingStep(secret: string, code: string, at: number): number | null {
  const given = Buffer.from(code)
  let found: number | null = null
  for (const step of [stepAt(at) - 1, stepAt(at), stepAt(at) + 1]) {
    const wanted = Buffer.from(codeOf(secret, step))
    if (given.length === wanted.length && timingSafeEqual(given, wanted)) found = step
  }
  return found
}
