import { expect, test } from 'vitest'
import { cleanText, isEmailAddress, normalEmail, suggestEmail } from './text.ts'

const kept = (text: string, max = 100) => {
  const cleaned = cleanText(text, { max })
  return cleaned.ok ? cleaned.text : null
}

test.each([
  "Siobhán O'Brien, Jr.",
  'Nguyễn',
  'Łukasz Żółć',
  'Şağ İı',
  '山田太郎',
  'אבג דן',
  'Иван',
  'Zoë 😀👩‍👩‍👧‍👦',
  '<script>alert(1)</script>',
  '=1+1',
  'null',
  '.',
  'X',
])('the name %s is kept as it is', name => {
  expect(kept(name)).toBe(name.normalize('NFC'))
})

test('invisible characters at the ends are no letters', () => {
  expect(kept('\u00a0\u200b Ana \ufeff')).toBe('Ana')
  expect(kept('\u00ad\u200dAna\u200c')).toBe('Ana')
})

test.each([
  ['zero-width spaces', '\u200b\u200b'],
  ['joiners and a soft hyphen', '\u200d\u200c\u00ad'],
  ['Hangul fillers', '\u3164\u3164'],
  ['blank Braille', '\u2800'],
  ['direction marks', '\u202e\u200f'],
  ['spaces', ' \t\u3000'],
])('%s alone are an empty text', (_what, text) => {
  expect(kept(text)).toBe('')
})

test('a long run of spaces inside is measured at once, not after seconds', () => {
  const long = `x${' '.repeat(200_000)}x`
  const started = performance.now()
  expect(kept(long, 300)).toBeNull()
  expect(performance.now() - started).toBeLessThan(1_000)
})

test('several lines are kept where they are asked for, and refused elsewhere', () => {
  expect(cleanText('Thank you,\nRuth', { max: 300, multiline: true })).toEqual({
    ok: true,
    text: 'Thank you,\nRuth',
  })
  expect(kept('Thank you,\nRuth')).toBeNull()
})

test('two spellings of one letter are one', () => {
  expect(kept('Zoe\u0308')).toBe('Zoë')
})

test.each([
  ['a NUL', 'a\0b'],
  ['a line break', 'a\nBcc: x'],
  ['a lone surrogate', 'a\ud83d'],
  ['fifty combining marks', `a${'\u0301'.repeat(50)}`],
  ['101 letters', 'x'.repeat(101)],
])('%s is refused', (_what, text) => {
  expect(kept(text)).toBeNull()
})

test('a hundred letters are a hundred, also when each takes two units', () => {
  expect(kept('😀'.repeat(100))).toBe('😀'.repeat(100))
})

test('direction overrides are dropped, the letters stay', () => {
  expect(kept('\u202eevil\u202c Ana')).toBe('evil Ana')
})

test.each([
  'a@b.co',
  "o'neil@b.co",
  'A+tag@Ex.COM',
  'ruth@example.com',
  `${'a'.repeat(64)}@${'b'.repeat(60)}.example.com`,
])('%s is an address', email => {
  expect(isEmailAddress(email)).toBe(true)
})

test.each([
  'a@b',
  'a..b@c.co',
  ' a@b.co',
  'a@b.co\nBcc:x',
  'a@b.co,evil@c.co',
  '"a b"@b.co',
  'a@[127.0.0.1]',
  'а@b.co',
  'a＠b.co',
  `${'a'.repeat(65)}@b.co`,
  `x@${'b'.repeat(250)}.co`,
  // 255 characters, one over what a mail path leaves for an address (RFC 5321, erratum 1690 to RFC 3696).
  `${'a'.repeat(64)}@${`${'b'.repeat(62)}.`.repeat(3)}co`,
  '',
])('%j is no address', email => {
  expect(isEmailAddress(email)).toBe(false)
})

test('addresses are compared in small letters', () => {
  expect(normalEmail('A+tag@Ex.COM')).toBe('a+tag@ex.com')
})

test.each([
  ['ruth@gmial.com', 'ruth@gmail.com'],
  ['ruth@gamil.com', 'ruth@gmail.com'],
  ['ruth@gmai.com', 'ruth@gmail.com'],
  ['ruth@gmail.con', 'ruth@gmail.com'],
  ['ruth@gmail.co', 'ruth@gmail.com'],
  ['Ruth.Ortega@YAHOOO.com', 'Ruth.Ortega@yahoo.com'],
  ['ruth@hotmal.com', 'ruth@hotmail.com'],
  ['ruth@comcast.nte', 'ruth@comcast.net'],
])('%s is questioned: did you mean %s', (typed, meant) => {
  expect(suggestEmail(typed)).toBe(meant)
})

test.each([
  'ruth@gmail.com',
  'ruth@mail.com',
  'ruth@ymail.com',
  'ruth@saltmarsh.example',
  'gmial.com',
  '@gmial.com',
  '',
])('%j is not questioned', typed => {
  expect(suggestEmail(typed)).toBeNull()
})
