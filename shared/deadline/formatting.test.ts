import { expect, test } from 'vitest'
import { formatDay, formatDays, formatDeadline, formatInstant, sameOffset, zoneName } from './formatting.ts'

test('days read as people say them', () => {
  expect(formatDay('2026-11-20', 'en')).toBe('Friday, November 20')
  expect(formatDay('2026-11-20', 'es')).toBe('viernes, 20 de noviembre')
  expect(formatDays('2026-12-17', '2026-12-18', 'en')).toBe('Thursday, December 17 to Friday, December 18')
})

test('a deadline is shown as its last minute, in the organization’s zone', () => {
  expect(formatDeadline(Date.parse('2026-11-21T05:00:00Z'), 'America/New_York', 'en')).toBe(
    'Friday, November 20, 11:59 pm',
  )
  expect(formatInstant(Date.parse('2026-11-20T16:05:00Z'), 'America/Phoenix', 'en')).toBe(
    'Friday, November 20, 9:05 am',
  )
})

test('zones are compared at the instant that matters', () => {
  expect(sameOffset('America/New_York', 'America/Detroit', Date.parse('2026-11-20T05:00:00Z'))).toBe(true)
  expect(sameOffset('America/Denver', 'America/Phoenix', Date.parse('2026-07-20T05:00:00Z'))).toBe(false)
  expect(zoneName('America/New_York', Date.parse('2026-11-20T05:00:00Z'), 'en')).toBe('Eastern time')
})

test('a zone is called what people there call it, the same all year where clocks never change', () => {
  const called = (zone: string, locale: 'en' | 'es') =>
    ['2026-07-20T05:00:00Z', '2026-11-20T05:00:00Z'].map(at => zoneName(zone, Date.parse(at), locale))
  expect(called('America/New_York', 'en')).toEqual(['Eastern time', 'Eastern time'])
  expect(called('America/Phoenix', 'en')).toEqual(['Mountain standard time', 'Mountain standard time'])
  expect(called('America/Chicago', 'es')).toEqual(['hora central', 'hora central'])
})

test('Spanish keeps its own way of writing the hour', () => {
  expect(formatDeadline(Date.parse('2026-11-21T05:00:00Z'), 'America/New_York', 'es')).toBe(
    'viernes, 20 de noviembre, 11:59 p.m.',
  )
})
