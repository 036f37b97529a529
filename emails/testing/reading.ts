import { expect } from 'vitest'
import type { Mail } from '../parts/words.ts'

/** What a reader of the HTML sees: without tags and without what stands in the head. */
export function visible(html: string): string {
  return html
    .replace(/^[\s\S]*?<body/, '<body')
    .replace(/<!--[\s\S]*?-->/g, '')
    .replace(/<[^>]*>/g, '')
    .replace(/&lt;/g, '<')
    .replace(/&gt;/g, '>')
    .replace(/&quot;/g, '"')
    .replace(/&#x27;/g, "'")
    .replace(/&amp;/g, '&')
}

/** Addresses the HTML links to. */
export function links(html: string): string[] {
  return [...html.matchAll(/<a [^>]*href="([^"]*)"/g)].map(match => match[1]!.replace(/&amp;/g, '&'))
}

/** What holds for every mail: one line of subject, nothing fetched, nothing run, all three forms filled. */
export function expectSoundMail(mail: Mail): void {
  expect(mail.subject).toMatch(/^[^\p{Cc}\u2028\u2029]{5,}$/u)
  expect(mail.html).not.toMatch(/<(img|script|link|iframe|object|form|svg)\b/i)
  expect(mail.html).not.toMatch(/url\(|@import|@font-face|\ssrc=|\sbackground=/i)
  expect(mail.html).toMatch(/<html[^>]* lang="en"/)
  expect(mail.html).toContain('<meta name="color-scheme" content="light only"/>')
  expect(mail.html).not.toMatch(/undefined|\[object Object\]|NaN/)
  expect(mail.text).not.toMatch(/undefined|\[object Object\]|NaN/)
  expect(mail.text.trim()).not.toBe('')
}

/** Names people have, and names people try. */
export const internationalNames = [
  "Siobhán O'Brien, Jr.",
  'Nguyễn',
  'Łukasz Żółć',
  'Şağ İı',
  '山田太郎',
  'אבג דן',
  'Иван',
  'Zoë 😀👩‍👩‍👧‍👦 🏴󠁧󠁢󠁳󠁣󠁴󠁿',
]
export const hostileNames = [
  '<b onclick=x>Bo</b>',
  '"><img onerror=alert(1)>',
  // biome-ignore lint/suspicious/noTemplateCurlyInString: a name somebody tries, not a template
  '{{7*7}} {name} ${x} #',
  "'; DROP TABLE orders; --",
  '=1+1',
  '\\u202eevil \\x41 \\u000a',
  'null',
]
