import { expect, test } from 'vitest'
import { csvLine } from './csv.ts'

test('cells are quoted as RFC 4180 asks', () => {
  expect(csvLine(['Pie, apple 9"', 'plain', 7, { cents: 1805 }])).toBe('"Pie, apple 9""",plain,7,18.05\r\n')
})

// OWASP, CSV injection; ASVS 5.0 requirement 1.2.10.
test.each(['=HYPERLINK("http://x")', '+1', '-1', '@SUM', '\t=1', '\r=1', '＝1'])(
  '%j is kept as text',
  text => {
    expect(csvLine([text]).startsWith(`"'`)).toBe(true)
  },
)
