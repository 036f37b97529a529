export type Cleaned = { ok: true; text: string } | { ok: false; message: string }

// Controls (a line break is allowed where asked for), and code points that change the direction of what follows.
const CONTROL = /[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f-\u009f\u2028\u2029\ufff9-\ufffb]/
const DIRECTION = /[\u202a-\u202e\u2066-\u2069\u200e\u200f\u061c]/g
const EDGES = /^[\s\u200b\u2060\ufeff]+|[\s\u200b\u2060\ufeff]+$/g
const LONE_SURROGATE = /[\ud800-\udbff](?![\udc00-\udfff])|(?<![\ud800-\udbff])[\udc00-\udfff]/
const MANY_MARKS = /\p{M}{9,}/u

/**
 * Text as it is kept: composed form (NFC), without invisible characters at its ends and without ones that turn
 * the direction of the text. Control characters, half characters and towers of marks are refused. `max` counts
 * code points, as people count letters.
 */
export function cleanText(input: string, options: { max: number; multiline?: boolean }): Cleaned {
  if (LONE_SURROGATE.test(input)) return { ok: false, message: 'This holds a broken character. Please type it again.' }
  const text = input.normalize('NFC').replace(DIRECTION, '').replace(EDGES, '')
  if (CONTROL.test(text) || (!options.multiline && /[\t\r\n]/.test(text)))
    return { ok: false, message: 'This holds characters that cannot be printed. Please type it again.' }
  if (MANY_MARKS.test(text)) return { ok: false, message: 'This cannot be printed. Please type it more simply.' }
  if ([...text].length > options.max) return { ok: false, message: `Please use at most ${options.max} letters.` }
  return { ok: true, text }
}

/** An address that one mail can be sent to: plain ASCII, at most 254 characters, 64 before the @ (RFC 5321). */
export function isEmailAddress(text: string): boolean {
  if (text.length > 254) return false
  const match = /^([A-Za-z0-9.!#$%&'*+/=?^_`{|}~-]{1,64})@([A-Za-z0-9-]+(?:\.[A-Za-z0-9-]+)+)$/.exec(text)
  if (!match) return false
  const [, local, domain] = match as unknown as [string, string, string]
  if (local.startsWith('.') || local.endsWith('.') || local.includes('..')) return false
  const labels = domain.split('.')
  if (!/^([A-Za-z]{2,}|xn--[A-Za-z0-9-]+)$/.test(labels.at(-1)!)) return false
  return labels.every(label => label.length <= 63 && !label.startsWith('-') && !label.endsWith('-'))
}

/** The form by which addresses are compared; what was typed is what mail is sent to. */
export function normalEmail(email: string): string {
  return email.trim().toLowerCase()
}
