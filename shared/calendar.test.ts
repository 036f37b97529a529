import { expect, test } from 'vitest'
import { addBusinessDays, addDays, addMonths, daysBetween, isDay, isWeekend, weekday } from './calendar.ts'

test('days are counted without clocks: a day with 25 hours is one day', () => {
  expect(addDays('2026-10-31', 2)).toBe('2026-11-02')
  expect(daysBetween('2026-10-31', '2026-11-02')).toBe(2)
  expect(addDays('2028-02-28', 1)).toBe('2028-02-29')
})

test('months end where the month ends', () => {
  expect(addMonths('2026-12-05', 3)).toBe('2027-03-05')
  expect(addMonths('2026-11-30', 3)).toBe('2027-02-28')
})

test('business days skip the weekend', () => {
  expect(weekday('2026-11-20')).toBe(5)
  expect(addBusinessDays('2026-11-20', 1)).toBe('2026-11-23')
  expect(addBusinessDays('2026-11-19', 7)).toBe('2026-11-30')
  expect(isWeekend('2026-11-21')).toBe(true)
})

test.each(['2026-02-30', '2026-13-01', '26-01-01', '2026-11-1', ''])('%s is no day', text => {
  expect(isDay(text)).toBe(false)
})
