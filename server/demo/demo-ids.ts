import { createHash } from 'node:crypto'

/** A public id that is the same at every seeding. The demonstration's only; real ones are random. */
export function demoId(name: string): string {
  return createHash('sha256').update(`tallykin demonstration ${name}`).digest('base64url').slice(0, 22)
}

/** The store links that are printed and stand in the README. */
export const demoLinks = {
  maya: demoId('link maya'),
  anh: demoId('link anh'),
  zoe: demoId('link zoe'),
  paused: demoId('link theo'),
  closed: demoId('link juniper'),
  notOpen: demoId('link windward'),
  group: demoId('link chassis'),
}

/** Numbers that look random and are the same at every seeding. */
export function demoRandom(seed: number) {
  let state = seed >>> 0
  const next = () => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0
    return state / 4_294_967_296
  }
  return {
    below: (n: number) => Math.floor(next() * n),
    bytes: (n: number) => Uint8Array.from({ length: n }, () => Math.floor(next() * 256)),
  }
}
