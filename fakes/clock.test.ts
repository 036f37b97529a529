import { expect, test } from 'vitest'
import { clockFrom, settableClock } from './clock.ts'

test('a clock starts from the given instant and runs on', async () => {
  const now = clockFrom('2026-11-20T23:59:00Z')
  const start = Date.parse('2026-11-20T23:59:00Z')

  const first = now()
  await new Promise(resolve => setTimeout(resolve, 30))
  const second = now()

  expect(first - start).toBeLessThan(20)
  expect(second - first).toBeGreaterThanOrEqual(29)
})

test('without an instant it is the machine’s clock', () => {
  expect(Math.abs(clockFrom(undefined)() - Date.now())).toBeLessThan(20)
})

test('what names no instant is refused', () => {
  expect(() => clockFrom('soon')).toThrow('TALLYKIN_NOW')
})

test('a clock that was set runs on from there and can be put back', () => {
  let base = 1_000
  const clock = settableClock(() => base)
  clock.set(50_000)
  base += 5
  const moved = clock.now()
  clock.restore()
  expect([moved, clock.now()]).toEqual([50_005, 1_005])
})
