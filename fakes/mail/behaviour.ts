/** How the catcher misbehaves on demand. Counters go down by one each time they are used. */
export type MailBehaviour = {
  /** The next recipients are refused for now, with 451. */
  refuseNext: number
  /** The next recipients are refused for good, with 550. */
  rejectNext: number
  /** The connection is cut while the next letters are being handed over; they are not kept. */
  dropConnectionNext: number
  /** The next letters are kept, and the connection is cut before the sender hears so. */
  loseAnswerNext: number
  /** How long the catcher takes before it answers for a letter. */
  latencyMs: number
}

export type MailBehaviourSwitch = ReturnType<typeof mailBehaviour>

export function mailBehaviour() {
  const current: MailBehaviour = {
    refuseNext: 0,
    rejectNext: 0,
    dropConnectionNext: 0,
    loseAnswerNext: 0,
    latencyMs: 0,
  }
  return {
    current,
    /** @throws RangeError naming what is not understood; then nothing is changed. */
    change(wish: unknown): void {
      if (typeof wish !== 'object' || wish === null || Array.isArray(wish))
        throw new RangeError('Send a JSON object.')
      for (const [name, value] of Object.entries(wish)) {
        if (!Object.hasOwn(current, name)) throw new RangeError(`There is no behaviour called ${name}.`)
        if (!Number.isInteger(value) || value < 0)
          throw new RangeError(`${name} cannot be ${JSON.stringify(value)}.`)
      }
      Object.assign(current, wish)
    },
    /** Whether this is to happen now; counts it. */
    use(name: Exclude<keyof MailBehaviour, 'latencyMs'>): boolean {
      if (current[name] <= 0) return false
      current[name]--
      return true
    },
  }
}
