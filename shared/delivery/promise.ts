import { addBusinessDays, type Day, daysBetween } from '../calendar.ts'

export type DelayAnswer = 'keep' | 'cancel' | null

export type Delay = {
  /** The last day of the window that was promised when the order was placed. */
  promisedUntil: Day
  /** The last day of the new window. */
  newUntil: Day
  /** How many delays of this order there were before. */
  earlierDelays: number
  /** Whether the notice said that silence keeps the order. */
  noticeSaidSilenceKeeps: boolean
  answer: DelayAnswer
  /** Whether the time to answer has run out. */
  timeIsUp: boolean
}

/** Days by which a first delay may go beyond the promise without the customer's own yes. */
const SILENCE_DAYS = 30

/**
 * What becomes of an order whose delivery moves. Within the promised window nothing is late and the order stands. The customer's answer decides; silence keeps the order
 * only for a first delay within 30 days of the promise, if the notice said so, else it cancels and refunds.
 */
export function delayOutcome(delay: Delay): 'kept' | 'canceled' | 'awaiting' {
  if (delay.answer === 'keep') return 'kept'
  if (delay.answer === 'cancel') return 'canceled'
  if (daysBetween(delay.promisedUntil, delay.newUntil) <= 0) return 'kept'
  if (silenceKeeps(delay)) return 'kept'
  return delay.timeIsUp ? 'canceled' : 'awaiting'
}

export function silenceKeeps(delay: Omit<Delay, 'answer' | 'timeIsUp'>): boolean {
  return (
    delay.earlierDelays === 0 &&
    delay.noticeSaidSilenceKeeps &&
    daysBetween(delay.promisedUntil, delay.newUntil) <= SILENCE_DAYS
  )
}

/** The last day for money paid by check to go back. Card refunds go out at once. */
export function checkRefundDue(canceledOn: Day): Day {
  return addBusinessDays(canceledOn, 7)
}
