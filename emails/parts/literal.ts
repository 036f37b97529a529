/**
 * What people typed, made harmless for a line of text, a header and an HTML page. The input forms refuse such
 * characters already; a mail does not rely on it.
 */

// Controls and line separators; the code points that turn the direction of what follows; halves of characters.
const CONTROL = /[\p{Cc}\u2028\u2029]+/gu
const DIRECTION = /[\u202a-\u202e\u2066-\u2069\u200e\u200f\u061c]/g
const LONE_SURROGATE = /[\ud800-\udbff](?![\udc00-\udfff])|(?<![\ud800-\udbff])[\udc00-\udfff]/g
const RIGHT_TO_LEFT =
  /[\p{Script=Hebrew}\p{Script=Arabic}\p{Script=Syriac}\p{Script=Thaana}\p{Script=Nko}\p{Script=Adlam}]/u

const FIRST_STRONG_ISOLATE = '\u2068'
const POP_ISOLATE = '\u2069'

/** One line, without controls and without marks that turn its direction; letters of every script stay. */
export function oneLine(text: string): string {
  return text.replace(CONTROL, ' ').replace(DIRECTION, '').replace(LONE_SURROGATE, '\ufffd').trim()
}

/** A subject: one line, whatever went into it. */
export function subjectLine(text: string): string {
  return text.replace(CONTROL, ' ').replace(/\s+/g, ' ').trim()
}

/** The facts of a mail with every text in them made one line of literal text. */
export function literalFacts<T>(facts: T): T {
  if (typeof facts === 'string') return oneLine(facts) as T
  if (Array.isArray(facts)) return facts.map(literalFacts) as T
  if (facts !== null && typeof facts === 'object')
    return Object.fromEntries(Object.entries(facts).map(([name, fact]) => [name, literalFacts(fact)])) as T
  return facts
}

/** Set apart from the direction of the sentence around it, where its script runs from right to left. */
export function isolated(text: string): string {
  return RIGHT_TO_LEFT.test(text) ? `${FIRST_STRONG_ISOLATE}${text}${POP_ISOLATE}` : text
}
