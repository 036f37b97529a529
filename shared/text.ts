import { isOneSlipApart } from './one-slip.ts'

/** Why a text is refused; worded by the catalog of refusals under `text.…`. */
export type TextProblem = 'broken' | 'unprintable' | 'tooManyMarks' | 'tooLong'

export type Cleaned = { ok: true; text: string } | { ok: false; problem: TextProblem }

// Controls (a line break is allowed where asked for), and code points that change the direction of what follows.
const CONTROL = /[^\P{Cc}\t\r\n]|[\u2028\u2029\ufff9-\ufffb]/u
const DIRECTION = /[\u202a-\u202e\u2066-\u2069\u200e\u200f\u061c]/g
// Spaces of every width and characters without any, one at a time: a pattern over whole runs takes seconds on a long one.
const SPACE = /\s|\u00ad|\u200b|\u200c|\u200d|\u2060|\ufeff/
const VISIBLE = /[^\s\u2800\p{Default_Ignorable_Code_Point}]/u
const LONE_SURROGATE = /[\ud800-\udbff](?![\udc00-\udfff])|(?<![\ud800-\udbff])[\udc00-\udfff]/
const MANY_MARKS = /\p{M}{9,}/u

/**
 * Text as it is kept: composed form (NFC), without invisible characters at its ends and without ones that turn
 * the direction of the text. Control characters, half characters and towers of marks are refused. `max` counts
 * code points, as people count letters.
 */
export function cleanText(input: string, options: { max: number; multiline?: boolean }): Cleaned {
  if (LONE_SURROGATE.test(input)) return { ok: false, problem: 'broken' }
  const text = trimInvisible(input.normalize('NFC').replace(DIRECTION, ''))
  if (CONTROL.test(text) || (!options.multiline && /[\t\r\n]/.test(text)))
    return { ok: false, problem: 'unprintable' }
  if (MANY_MARKS.test(text)) return { ok: false, problem: 'tooManyMarks' }
  if ([...text].length > options.max) return { ok: false, problem: 'tooLong' }
  return { ok: true, text }
}

/** Without spaces and invisible characters at its ends; empty when nothing in it can be seen. */
function trimInvisible(text: string): string {
  let start = 0
  let end = text.length
  while (start < end && SPACE.test(text[start]!)) start += 1
  while (end > start && SPACE.test(text[end - 1]!)) end -= 1
  const trimmed = text.slice(start, end)
  return VISIBLE.test(trimmed) ? trimmed : ''
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

/** Where most people's mail is. */
const MAIL_DOMAINS = [
  'gmail.com',
  'yahoo.com',
  'hotmail.com',
  'outlook.com',
  'icloud.com',
  'aol.com',
  'comcast.net',
  'verizon.net',
  'sbcglobal.net',
  'bellsouth.net',
  'earthlink.net',
  'protonmail.com',
  'rocketmail.com',
]
/** Mail services whose true name is one slip from a common one. */
const NEAR_BUT_REAL = ['mail.com', 'ymail.com', 'email.com']

/**
 * The address somebody probably meant, when the part after the @ is one slip from a common one ("gmial.com");
 * null when there is nothing to ask. Only ever a question: the address typed may well be right.
 */
export function suggestEmail(email: string): string | null {
  const at = email.lastIndexOf('@')
  const domain = email.slice(at + 1).toLowerCase()
  if (at < 1 || MAIL_DOMAINS.includes(domain) || NEAR_BUT_REAL.includes(domain)) return null
  const meant = MAIL_DOMAINS.find(known => isOneSlipApart(known, domain))
  return meant ? `${email.slice(0, at)}@${meant}` : null
}
