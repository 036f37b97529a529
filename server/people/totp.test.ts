import { expect, test } from 'vitest'
import { codeOf, matchingStep, STEP_MS, stepAt } from './totp.ts'

// RFC 6238, appendix B: the SHA-1 rows; instants in seconds, codes of eight digits.
const SECRET = '12345678901234567890'

test.each([
  [59, '94287082'],
  [1_111_111_109, '07081804'],
  [1_111_111_111, '14050471'],
  [1_234_567_890, '89005924'],
  [2_000_000_000, '69279037'],
  [20_000_000_000, '65353130'],
])('the code at second %i is %s, and its last six digits the short one', (second, code) => {
  expect(codeOf(SECRET, stepAt(second * 1000), 8)).toBe(code)
  expect(codeOf(SECRET, stepAt(second * 1000))).toBe(code.slice(2))
})

test('a code counts from one step early to one step late, never two', () => {
  const at = 1_234_567_890_000
  const from = (steps: number) => matchingStep(SECRET, codeOf(SECRET, stepAt(at) + steps), at)

  expect([-2, -1, 0, 1, 2].map(from)).toEqual([null, stepAt(at) - 1, stepAt(at), stepAt(at) + 1, null])
  expect(STEP_MS).toBe(30_000)
})

test.each(['', '12345', '1234567', '00592４', 'abcdef'])('%j is no code', code => {
  expect(matchingStep(SECRET, code, 1_234_567_890_000)).toBeNull()
})
