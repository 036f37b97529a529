/**
 * Whether two texts are one slip of the hand apart: one character wrong, missing or added, or two neighbors
 * swapped. The same text is no slip.
 */
export function isOneSlipApart(a: string, b: string): boolean {
  if (a === b || Math.abs(a.length - b.length) > 1) return false
  let same = 0
  while (same < a.length && a[same] === b[same]) same += 1
  const [restA, restB] = [a.slice(same), b.slice(same)]
  if (restA.length !== restB.length) {
    return restA.length > restB.length ? restA.slice(1) === restB : restB.slice(1) === restA
  }
  if (restA.slice(1) === restB.slice(1)) return true
  return restA[0] === restB[1] && restA[1] === restB[0] && restA.slice(2) === restB.slice(2)
}
