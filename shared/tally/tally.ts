/** Five-bar gates of a count: 13 is two full gates and three strokes. */
export function tallyGroups(count: number): number[] {
  const full = Math.floor(count / 5)
  const rest = count % 5
  return [...Array.from({ length: full }, () => 5), ...(rest > 0 ? [rest] : [])]
}

/** Prizes earned with a tally when every so many marks earn one, and the marks still missing to the next. */
export function nextPrize(tally: number, every: number): { earned: number; toNext: number } {
  const earned = Math.floor(tally / every)
  return { earned, toNext: (earned + 1) * every - tally }
}
