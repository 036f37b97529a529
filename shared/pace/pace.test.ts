import { expect, test } from 'vitest'
import { paceEstimate } from './pace.ts'

const byDay = new Map([
  ['2026-11-10', 30],
  ['2026-11-11', 12],
  ['2026-11-12', 9],
  ['2026-11-13', 6],
])

test('the mean of the last three full days goes on to the last day', () => {
  const drive = { byDay, firstDay: '2026-11-10', today: '2026-11-14', lastDay: '2026-11-24', current: 60 }
  expect(paceEstimate(drive)).toBe(60 + 9 * 10)
})

test('after exactly three full days there is an estimate', () => {
  const drive = { byDay, firstDay: '2026-11-10', today: '2026-11-13', lastDay: '2026-11-14', current: 51 }
  expect(paceEstimate(drive)).toBe(51 + 17)
})

test('no estimate before three full days, and none of the future after the close', () => {
  const drive = { byDay, firstDay: '2026-11-10', today: '2026-11-12', lastDay: '2026-11-24', current: 42 }
  expect(paceEstimate(drive)).toBeNull()
  expect(paceEstimate({ ...drive, today: '2026-11-26', current: 57 })).toBe(57)
})
