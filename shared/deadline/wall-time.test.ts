import fc from 'fast-check'
import { expect, test } from 'vitest'
import { addDays } from '../calendar.ts'
import { closeInstant, isValidZone, localDay, resolveWallTime } from './wall-time.ts'

const iso = (date: string, time: string, zone: string) => {
  const resolved = resolveWallTime({ date, time }, zone)
  return resolved.ok ? new Date(resolved.instant).toISOString() : resolved.reason
}

// Computed from the IANA time zone database, release 2026c.
test.each([
  ['2026-11-01', '23:59', 'America/New_York', '2026-11-02T04:59:00.000Z'],
  ['2026-10-31', '23:59', 'America/New_York', '2026-11-01T03:59:00.000Z'],
  ['2026-11-01', '23:59', 'America/Chicago', '2026-11-02T05:59:00.000Z'],
  ['2026-11-01', '23:59', 'America/Phoenix', '2026-11-02T06:59:00.000Z'],
  ['2026-11-01', '23:59', 'America/Los_Angeles', '2026-11-02T07:59:00.000Z'],
  ['2026-11-01', '23:59', 'Pacific/Honolulu', '2026-11-02T09:59:00.000Z'],
  ['2026-11-01', '23:59', 'America/Adak', '2026-11-02T09:59:00.000Z'],
  ['2026-11-01', '23:59', 'America/Puerto_Rico', '2026-11-02T03:59:00.000Z'],
  ['2026-11-02', '00:00', 'America/New_York', '2026-11-02T05:00:00.000Z'],
  ['2027-03-14', '02:30', 'America/Phoenix', '2027-03-14T09:30:00.000Z'],
])('%s %s in %s is %s', (date, time, zone, instant) => {
  expect(iso(date, time, zone)).toBe(instant)
})

test('a time that occurs twice takes the later instant and says so', () => {
  const resolved = resolveWallTime({ date: '2026-11-01', time: '01:30' }, 'America/New_York')
  expect(resolved).toEqual({ ok: true, instant: Date.parse('2026-11-01T06:30:00Z'), ambiguous: true })
})

test('a time that the clocks jump over is refused with the reason', () => {
  expect(iso('2027-03-14', '02:30', 'America/New_York')).toBe('nonexistent')
})

test.each([
  ['2026-02-30', '10:00', 'America/New_York', 'invalid_date'],
  ['2026-02-03', '24:00', 'America/New_York', 'invalid_time'],
  ['2026-02-03', '9:00', 'America/New_York', 'invalid_time'],
  ['2026-02-03', '10:00', 'US/Pacific-New', 'invalid_zone'],
  ['9999-99-99', '10:00', 'America/New_York', 'invalid_date'],
])('%s %s in %s is refused: %s', (date, time, zone, reason) => {
  expect(iso(date, time, zone)).toBe(reason)
})

test('a day of a zone may have 23, 24 or 25 hours', () => {
  const hours = (day: string, zone: string) => {
    const [from, to] = [day, addDays(day, 1)].map(date => resolveWallTime({ date, time: '00:00' }, zone))
    if (!from?.ok || !to?.ok) throw new Error('midnight exists here')
    return (to.instant - from.instant) / 3_600_000
  }
  expect(hours('2026-11-01', 'America/New_York')).toBe(25)
  expect(hours('2027-03-14', 'America/New_York')).toBe(23)
  expect(hours('2026-11-01', 'America/Phoenix')).toBe(24)
  expect(hours('2027-03-14', 'America/Phoenix')).toBe(24)
})

test.each([
  'America/New_York',
  'America/Indiana/Indianapolis',
  'America/Kentucky/Louisville',
  'America/North_Dakota/Center',
  'America/Port-au-Prince',
  'Pacific/Honolulu',
  'Asia/Kolkata',
])('%s is a zone', zone => {
  expect(isValidZone(zone)).toBe(true)
})

test.each([
  'US/Pacific-New',
  'US/Pacific',
  'EST',
  'Etc/GMT+5',
  '+05:00',
  'america/new_york',
  'America/New_york',
  'America/Saltmarsh',
  'America/',
  '../New_York',
  '',
])('%j is no zone', zone => {
  expect(isValidZone(zone)).toBe(false)
})

test('"closes 11:59 pm" shuts at the end of that minute', () => {
  expect(closeInstant({ date: '2026-11-01', time: '23:59' }, 'America/New_York')).toMatchObject({
    instant: Date.parse('2026-11-02T05:00:00Z'),
  })
})

test('any resolved instant reads as the wall time that was asked for', () => {
  const zones = fc.constantFrom(
    'America/New_York',
    'America/Phoenix',
    'Pacific/Honolulu',
    'America/St_Johns',
    'Australia/Lord_Howe',
  )
  const minute = fc.integer({ min: 0, max: 365 * 24 * 60 })
  fc.assert(
    fc.property(zones, minute, (zone, offset) => {
      const text = new Date(Date.UTC(2026, 6, 1) + offset * 60_000).toISOString()
      const resolved = resolveWallTime({ date: text.slice(0, 10), time: text.slice(11, 16) }, zone)
      if (!resolved.ok) return expect(resolved.reason).toBe('nonexistent')
      const shown = new Intl.DateTimeFormat('sv-SE', {
        timeZone: zone,
        dateStyle: 'short',
        timeStyle: 'short',
      }).format(resolved.instant)
      expect(shown).toBe(`${text.slice(0, 10)} ${text.slice(11, 16)}`)
    }),
    { numRuns: 400 },
  )
})

test('an order at 11:30 pm belongs to that day where the drive is', () => {
  expect(localDay(Date.parse('2026-11-20T04:30:00Z'), 'America/New_York')).toBe('2026-11-19')
  expect(localDay(Date.parse('2026-11-20T04:30:00Z'), 'Pacific/Honolulu')).toBe('2026-11-19')
})
