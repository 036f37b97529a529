/**
 * The machine's clock, or one that starts from a given instant and runs on from there.
 *
 * @param iso an ISO 8601 instant such as `2026-11-20T23:59:00Z`, or undefined for the machine's clock
 * @returns the time in milliseconds since 1970 UTC
 * @throws RangeError when the text names no instant
 */
export function clockFrom(iso: string | undefined): () => number {
  if (iso === undefined || iso === '') return Date.now
  const start = Date.parse(iso)
  if (Number.isNaN(start)) throw new RangeError(`TALLYKIN_NOW must be an ISO instant, not "${iso}"`)
  // performance.now() is steady: a correction of the machine's clock does not make this one jump.
  const begun = performance.now()
  return () => Math.floor(start + (performance.now() - begun))
}

export type SettableClock = { now: () => number; set(instant: number): void; restore(): void }

/** A clock that can be moved to another instant and then runs on at the pace of the one it wraps. */
export function settableClock(base: () => number): SettableClock {
  let ahead = 0
  return {
    now: () => base() + ahead,
    set(instant) {
      ahead = instant - base()
    },
    restore() {
      ahead = 0
    },
  }
}
