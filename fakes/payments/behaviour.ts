/** How the stand-in misbehaves on demand. Counters go down by one each time they are used. */
export type Behaviour = {
  /** Extra copies of each event from now on. */
  duplicate: number
  /** How long each event waits before its first delivery. */
  delayMs: number
  /** Hold each event for a random time, two seconds at most, so that they arrive out of order. */
  shuffle: boolean
  /** While true no webhook goes out; what waits goes out afterwards. */
  drop: boolean
  /** The next calls fail at the front door: nothing is done, nothing is remembered. */
  failNextCalls: number
  /** The status those calls are answered with. */
  failStatus: number
  /** The next calls fail while being carried out: 500, remembered under their idempotency key. */
  breakNextCalls: number
  /** The next calls are carried out, and the connection is cut before the answer. */
  loseNextAnswers: number
  /** The next calls are carried out, and the answer breaks off half-way. */
  truncateNextAnswers: number
  /** How long each API call takes at least. */
  latencyMs: number
  /** Added, in cents, to the amount of the next session that is paid. */
  wrongAmountNext: number
  /** The currency of the next session that is paid. */
  wrongCurrencyNext: string
}

const USUAL: Behaviour = {
  duplicate: 0,
  delayMs: 0,
  shuffle: false,
  drop: false,
  failNextCalls: 0,
  failStatus: 500,
  breakNextCalls: 0,
  loseNextAnswers: 0,
  truncateNextAnswers: 0,
  latencyMs: 0,
  wrongAmountNext: 0,
  wrongCurrencyNext: '',
}

export type BehaviourSwitch = {
  current: Behaviour
  change(wish: unknown): void
  restore(): void
  use(name: Counter): boolean
}
type Counter = 'failNextCalls' | 'breakNextCalls' | 'loseNextAnswers' | 'truncateNextAnswers'

export function behaviourSwitch(): BehaviourSwitch {
  const current = { ...USUAL }
  return {
    current,
    /** @throws RangeError naming what is not understood; then nothing is changed. */
    change(wish) {
      if (typeof wish !== 'object' || wish === null || Array.isArray(wish))
        throw new RangeError('Send a JSON object.')
      for (const [name, value] of Object.entries(wish)) {
        if (!Object.hasOwn(USUAL, name)) throw new RangeError(`There is no behaviour called ${name}.`)
        const usual = USUAL[name as keyof Behaviour]
        const isSound =
          typeof value === typeof usual &&
          (typeof value !== 'number' ||
            (Number.isInteger(value) && (value >= 0 || name === 'wrongAmountNext')))
        if (!isSound) throw new RangeError(`${name} cannot be ${JSON.stringify(value)}.`)
      }
      Object.assign(current, wish)
    },
    restore: () => void Object.assign(current, USUAL),
    /** Whether this is to happen now; counts it. */
    use(name) {
      if (current[name] <= 0) return false
      current[name]--
      return true
    },
  }
}
