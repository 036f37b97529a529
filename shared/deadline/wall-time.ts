import { DateTime } from 'luxon'
import { isDay } from '../calendar.ts'

export type WallTime = { date: string; time: string }

export type Resolved =
  | { ok: true; instant: number; ambiguous: boolean }
  | { ok: false; reason: 'nonexistent' | 'invalid_zone' | 'invalid_date' | 'invalid_time' }

const HOUR_MS = 3_600_000

// Names by area and place. Abbreviations, offsets and the old national names ("US/Pacific") are not among them.
const AREA_AND_PLACE =
  /^(Africa|America|Antarctica|Arctic|Asia|Atlantic|Australia|Europe|Indian|Pacific)(\/[A-Z][A-Za-z_-]+){1,2}$/

/**
 * Whether a text is the name of a time zone as the IANA database spells it. The runtime's own list of names
 * will not do: it holds America/Indianapolis where the database says America/Indiana/Indianapolis.
 */
export function isValidZone(zone: string): boolean {
  if (!AREA_AND_PLACE.test(zone)) return false
  try {
    const { timeZone } = new Intl.DateTimeFormat('en-US', { timeZone: zone }).resolvedOptions()
    return timeZone === zone || timeZone.toLowerCase() !== zone.toLowerCase()
  } catch {
    return false
  }
}

/**
 * The instant of a local wall time. One that does not exist (the clocks go forward over it) is refused; of one
 * that occurs twice (the clocks go back) the later counts, so that nobody is shut out early.
 */
export function resolveWallTime(wall: WallTime, zone: string): Resolved {
  if (!isValidZone(zone)) return { ok: false, reason: 'invalid_zone' }
  if (!isDay(wall.date)) return { ok: false, reason: 'invalid_date' }
  if (!/^([01]\d|2[0-3]):[0-5]\d$/.test(wall.time)) return { ok: false, reason: 'invalid_time' }
  const at = DateTime.fromISO(`${wall.date}T${wall.time}`, { zone })
  const reads = (instant: number) => DateTime.fromMillis(instant, { zone }).toFormat("yyyy-MM-dd'T'HH:mm")
  const wanted = `${wall.date}T${wall.time}`
  // Offsets change by at most a few hours; whoever reads the wanted wall time around here is a candidate.
  const candidates = [-3, -2, -1, -0.5, 0, 0.5, 1, 2, 3]
    .map(hours => at.toMillis() + hours * HOUR_MS)
    .filter(instant => reads(instant) === wanted)
  if (candidates.length === 0) return { ok: false, reason: 'nonexistent' }
  return { ok: true, instant: Math.max(...candidates), ambiguous: candidates.length > 1 }
}

/**
 * The first instant at which a store is shut that "closes 11:59 pm": the end of that minute, so everybody who
 * reads 11:59 on their clock is in time.
 */
export function closeInstant(wall: WallTime, zone: string): Resolved {
  const resolved = resolveWallTime(wall, zone)
  return resolved.ok ? { ...resolved, instant: resolved.instant + 60_000 } : resolved
}

/** The calendar day of an instant where the drive is. */
export function localDay(instant: number, zone: string): string {
  return DateTime.fromMillis(instant, { zone }).toFormat('yyyy-MM-dd')
}
