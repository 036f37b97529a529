import fc from 'fast-check'
import { expect, test } from 'vitest'
import { isLastHour, payableUntil, type StoreTimes, storeStatus } from './store-status.ts'
import { closeInstant } from './wall-time.ts'

function aStore(changes: Partial<StoreTimes> = {}): StoreTimes {
  return {
    opensAt: 1_000,
    closesAt: 9_000,
    closedEarlyAt: null,
    linkPaused: false,
    launched: true,
    ...changes,
  }
}

test.each([
  [999, 'not_open'],
  [1_000, 'open'],
  [8_999, 'open'],
  [9_000, 'closed'],
  [9_001, 'closed'],
] as const)('at %i the store is %s', (now, status) => {
  expect(storeStatus(aStore(), now)).toBe(status)
})

test('in three zones, the last millisecond of 11:59 pm is open and the next is closed', () => {
  for (const zone of ['America/New_York', 'America/Phoenix', 'Pacific/Honolulu']) {
    const closes = closeInstant({ date: '2026-11-01', time: '23:59' }, zone)
    if (!closes.ok) throw new Error('this time exists')
    const store = aStore({ opensAt: 0, closesAt: closes.instant })
    expect(storeStatus(store, closes.instant - 1)).toBe('open')
    expect(storeStatus(store, closes.instant)).toBe('closed')
  }
})

test('closed early counts from its instant, a pause only while the store would be open', () => {
  expect(storeStatus(aStore({ closedEarlyAt: 5_000 }), 4_999)).toBe('open')
  expect(storeStatus(aStore({ closedEarlyAt: 5_000 }), 5_000)).toBe('closed')
  expect(storeStatus(aStore({ linkPaused: true }), 5_000)).toBe('paused')
  expect(storeStatus(aStore({ linkPaused: true }), 9_000)).toBe('closed')
  expect(storeStatus(aStore({ linkPaused: true }), 500)).toBe('not_open')
  expect(storeStatus(aStore({ launched: false }), 5_000)).toBe('not_open')
})

test('a store is open exactly inside its bounds', () => {
  const times = fc.record({
    opensAt: fc.integer({ min: 0, max: 1_000 }),
    length: fc.integer({ min: 1, max: 1_000 }),
    early: fc.option(fc.integer({ min: 0, max: 2_000 }), { nil: null }),
    paused: fc.boolean(),
    now: fc.integer({ min: 0, max: 2_500 }),
  })
  fc.assert(
    fc.property(times, ({ opensAt, length, early, paused, now }) => {
      const store = aStore({ opensAt, closesAt: opensAt + length, closedEarlyAt: early, linkPaused: paused })
      const inside = now >= opensAt && now < opensAt + length && (early === null || now < early) && !paused
      expect(storeStatus(store, now) === 'open').toBe(inside)
    }),
  )
})

test('the last hour is the hour before the close', () => {
  expect(isLastHour(3_600_000 * 5, 3_600_000 * 4)).toBe(true)
  expect(isLastHour(3_600_000 * 5, 3_600_000 * 4 - 1)).toBe(false)
  expect(isLastHour(3_600_000 * 5, 3_600_000 * 5)).toBe(false)
})

test('an order placed a millisecond before the close may be paid for thirty minutes', () => {
  const closes = Date.parse('2026-11-21T05:00:00Z')
  expect(payableUntil(closes - 1)).toBe(Date.parse('2026-11-21T05:29:59.999Z'))
})
