import { addDays, daysBetween } from '../calendar.ts'

/**
 * What a drive would come to if the pace of its last three full local days held. Null before three full days
 * have passed. An estimate, which reads low until paper forms are keyed; never shown to customers.
 */
export function paceEstimate(drive: {
  /** Items by local day; a day without any may be missing. */
  byDay: ReadonlyMap<string, number>
  /** The first full local day of selling. */
  firstDay: string
  today: string
  lastDay: string
  /** Items so far, today's included. */
  current: number
}): number | null {
  if (daysBetween(drive.firstDay, drive.today) < 3) return null
  const lastThree = [1, 2, 3].map(back => drive.byDay.get(addDays(drive.today, -back)) ?? 0)
  const mean = lastThree.reduce((sum, n) => sum + n, 0) / 3
  const daysLeft = Math.max(0, daysBetween(drive.today, drive.lastDay))
  return Math.round(drive.current + mean * daysLeft)
}
