/** The one clock, in milliseconds since 1970 UTC. Passed to whoever needs the time. */
export type Now = () => number

/** The machine's clock, or one that starts from a given instant and runs on from there. */
export function makeClock(startsAt: number | null): Now {
  if (startsAt === null) return Date.now
  const begun = performance.now()
  return () => Math.floor(startsAt + (performance.now() - begun))
}
