import type { Locale } from '../wire.ts'

const tags: Record<Locale, string> = { en: 'en-US', es: 'es-US' }

/** "Friday, November 20" of a calendar day. */
export function formatDay(day: string, locale: Locale): string {
  return new Intl.DateTimeFormat(tags[locale], {
    timeZone: 'UTC',
    weekday: 'long',
    month: 'long',
    day: 'numeric',
  }).format(new Date(`${day}T12:00:00Z`))
}

/** "Thursday, December 17" or "Thursday, December 17 to Friday, December 18". */
export function formatDays(from: string, to: string, locale: Locale): string {
  if (from === to) return formatDay(from, locale)
  return `${formatDay(from, locale)} ${locale === 'es' ? 'al' : 'to'} ${formatDay(to, locale)}`
}

/** "Friday, November 20, 11:59 pm" of an instant, as clocks in the zone read. */
export function formatInstant(instant: number, zone: string, locale: Locale): string {
  const format = (options: Intl.DateTimeFormatOptions) =>
    new Intl.DateTimeFormat(tags[locale], { timeZone: zone, ...options }).format(instant)
  const day = format({ weekday: 'long', month: 'long', day: 'numeric' })
  const time = format({ hour: 'numeric', minute: '2-digit', hour12: true })
  return `${day}, ${lowerHalfDay(time, locale)}`
}

/** A short form for tables: "Nov 20, 4:12 pm". */
export function formatShortInstant(instant: number, zone: string, locale: Locale): string {
  const text = new Intl.DateTimeFormat(tags[locale], {
    timeZone: zone,
    month: 'short',
    day: 'numeric',
    hour: 'numeric',
    minute: '2-digit',
    hour12: true,
  }).format(instant)
  return lowerHalfDay(text, locale)
}

/** A deadline given by the first instant that is too late, read as the last minute that is in time. */
export function formatDeadline(closesAt: number, zone: string, locale: Locale): string {
  return formatInstant(closesAt - 60_000, zone, locale)
}

/** "Eastern time" of a zone at an instant; where clocks never change, "Mountain standard time". */
export function zoneName(zone: string, instant: number, locale: Locale): string {
  const parts = new Intl.DateTimeFormat(tags[locale], {
    timeZone: zone,
    timeZoneName: 'longGeneric',
  }).formatToParts(instant)
  const name = parts.find(part => part.type === 'timeZoneName')?.value ?? zone
  return locale === 'en' ? name.replace(/( Standard)? Time$/, ending => ending.toLowerCase()) : name
}

/** Whether clocks in two zones read the same at an instant. */
export function sameOffset(zoneA: string, zoneB: string, instant: number): boolean {
  return formatInstant(instant, zoneA, 'en') === formatInstant(instant, zoneB, 'en')
}

/**
 * The formatter puts a narrow space before AM; English written by hand puts a plain one and small letters.
 * Spanish ("11:59 p.m.") already reads as written.
 */
function lowerHalfDay(text: string, locale: Locale): string {
  if (locale !== 'en') return text
  return text.replace(/[\u202f\u00a0 ]([AP])\.?\s?M\.?$/i, (_all, half: string) => ` ${half.toLowerCase()}m`)
}
