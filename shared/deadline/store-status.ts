export type StoreStatus = 'not_open' | 'open' | 'paused' | 'closed'

/** What decides whether a store takes orders. All instants in milliseconds; ranges are half-open. */
export type StoreTimes = {
  opensAt: number
  closesAt: number
  closedEarlyAt: number | null
  linkPaused: boolean
  launched: boolean
}

/** Minutes an order that was placed in time may still be paid: the shortest the payment service allows. */
export const SESSION_MINUTES = 30

/** The first instant at which an order can no longer be paid; the close in between changes nothing. */
export function payableUntil(placedAt: number): number {
  return placedAt + SESSION_MINUTES * 60_000
}

/**
 * Whether a store is open at an instant: from the opening, before the close, not paused, not closed early.
 * Derived from the clock each time; no job sets a flag that might come late.
 */
export function storeStatus(store: StoreTimes, now: number): StoreStatus {
  if (!store.launched || now < store.opensAt) return 'not_open'
  if (now >= closingInstant(store)) return 'closed'
  return store.linkPaused ? 'paused' : 'open'
}

/** The first instant at which nothing can be placed any more. */
export function closingInstant(store: Pick<StoreTimes, 'closesAt' | 'closedEarlyAt'>): number {
  return Math.min(store.closesAt, store.closedEarlyAt ?? store.closesAt)
}

/** The last hour before the close, in which the store says what leaving the payment page means. */
export function isLastHour(closesAt: number, now: number): boolean {
  return now < closesAt && closesAt - now <= 3_600_000
}
