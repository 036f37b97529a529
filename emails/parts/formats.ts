import type { Locale } from '#shared/wire.ts'

const tags: Record<Locale, string> = { en: 'en-US', es: 'es-US' }

/** "Thursday, November 12, 2026" of an instant, as calendars in the zone read. */
export function fullDay(instant: number, timeZone: string, locale: Locale): string {
  return new Intl.DateTimeFormat(tags[locale], { timeZone, dateStyle: 'full' }).format(instant)
}

/** "March 17 – June 17, 2027" of two calendar days, or "December 17, 2027" of one; with the year, being far off. */
export function dayRange(from: string, to: string, locale: Locale): string {
  const format = new Intl.DateTimeFormat(tags[locale], {
    timeZone: 'UTC',
    year: 'numeric',
    month: 'long',
    day: 'numeric',
  })
  const noon = (day: string) => new Date(`${day}T12:00:00Z`)
  return from === to ? format.format(noon(from)) : format.formatRange(noon(from), noon(to))
}

/** "40%" of basis points; "12.5%" where there is a fraction. */
export function percentOf(basisPoints: number, locale: Locale): string {
  return new Intl.NumberFormat(tags[locale], { style: 'percent', maximumFractionDigits: 2 }).format(
    basisPoints / 10_000,
  )
}
