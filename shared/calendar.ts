/** Calendar days as `YYYY-MM-DD` text: arithmetic without clocks or zones. */
export type Day = string

const DAY_MS = 86_400_000

function toUtc(day: Day): number {
  const match = /^(\d{4})-(\d{2})-(\d{2})$/.exec(day)
  if (!match) throw new RangeError(`${day} is no calendar day`)
  const at = Date.UTC(Number(match[1]), Number(match[2]) - 1, Number(match[3]))
  if (new Date(at).toISOString().slice(0, 10) !== day) throw new RangeError(`${day} is no calendar day`)
  return at
}

const toDay = (at: number): Day => new Date(at).toISOString().slice(0, 10)

export function isDay(text: string): boolean {
  try {
    toUtc(text)
    return true
  } catch {
    return false
  }
}

export function addDays(day: Day, days: number): Day {
  return toDay(toUtc(day) + days * DAY_MS)
}

/** Calendar months later; the last day of the month where that day does not exist. */
export function addMonths(day: Day, months: number): Day {
  const start = new Date(toUtc(day))
  const target = new Date(Date.UTC(start.getUTCFullYear(), start.getUTCMonth() + months + 1, 0))
  target.setUTCDate(Math.min(start.getUTCDate(), target.getUTCDate()))
  return toDay(target.getTime())
}

export function daysBetween(from: Day, to: Day): number {
  return Math.round((toUtc(to) - toUtc(from)) / DAY_MS)
}

/** 0 is Sunday, 6 Saturday. */
export function weekday(day: Day): number {
  return new Date(toUtc(day)).getUTCDay()
}

export function isWeekend(day: Day): boolean {
  return weekday(day) % 6 === 0
}

/** So many days later that are no weekend days; holidays are not known here. */
export function addBusinessDays(day: Day, days: number): Day {
  let at = day
  for (let left = days; left > 0; ) {
    at = addDays(at, 1)
    if (!isWeekend(at)) left -= 1
  }
  return at
}
