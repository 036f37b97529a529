import { randomBytes } from 'node:crypto'

const LETTERS = 'ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789'

/** Random letters and digits, each equally likely: bytes past the last full round of 62 are thrown away. */
export function randomText(length: number): string {
  let text = ''
  while (text.length < length) {
    for (const byte of randomBytes(length * 2)) {
      if (byte < 248 && text.length < length) text += LETTERS[byte % 62]
    }
  }
  return text
}

export const newSessionId = () => `cs_test_${randomText(58)}`
export const newPaymentIntentId = () => `pi_3${randomText(23)}`
export const newChargeId = () => `ch_3${randomText(23)}`
export const newRefundId = () => `re_3${randomText(23)}`
export const newEventId = () => `evt_1${randomText(23)}`
export const newRequestId = () => `req_${randomText(14)}`
