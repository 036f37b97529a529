import { createHmac } from 'node:crypto'
import type { Behaviour } from './behaviour.ts'
import type { Books } from './books.ts'

const AT_ONCE = 8
const MOST_TRIES = 20
const FIRST_WAIT_MS = 500
const LONGEST_WAIT_MS = 30_000
const LONGEST_HOLD_MS = 2_000
const ANSWER_LIMIT_MS = 10_000

export type WebhookSender = ReturnType<typeof startWebhookSender>
type Due = { seq: number; event_id: string; attempts: number; due_at: number }
type Outcome = { delivered: boolean; answer: string }

/**
 * The scheme the payment service documents: the stamp in Unix seconds, then HMAC-SHA256 over the stamp, a dot and
 * the body exactly as sent, in hexadecimal.
 */
export function signatureOf(body: string, secret: string, second: number): string {
  const hash = createHmac('sha256', secret).update(`${second}.${body}`).digest('hex')
  return `t=${second},v1=${hash}`
}

/** How long to wait after so many tries: half a second, doubled each time, thirty seconds at most. */
export function waitAfter(tries: number): number {
  return Math.min(LONGEST_WAIT_MS, FIRST_WAIT_MS * 2 ** (tries - 1))
}

/**
 * Delivers events until the receiver answers 2xx. What is still to be delivered is in the books, so it survives a
 * restart; it is timed by the machine's clock, since the stand-in's own may be moved.
 */
export function startWebhookSender(options: {
  books: Books
  url: string | (() => string)
  secret: string
  now: () => number
  behaviour: Behaviour
}) {
  const { books, behaviour } = options
  const insert = books.db.prepare('INSERT INTO delivery (event_id, due_at) VALUES (?, ?)')
  const next = books.db.prepare(
    "SELECT seq, event_id, attempts, due_at FROM delivery WHERE state = 'pending' ORDER BY due_at, seq LIMIT ?",
  )
  const mark = books.db.prepare(
    'UPDATE delivery SET state = ?, attempts = ?, due_at = ?, last_answer = ? WHERE seq = ?',
  )
  const ofEvent = books.db.prepare(
    'SELECT state, attempts, last_answer FROM delivery WHERE event_id = ? ORDER BY seq',
  )
  const underWay = new Map<number, Promise<void>>()
  const waiting = new Map<number, (outcome: Outcome) => void>()
  const closing = new AbortController()
  let timer: NodeJS.Timeout | undefined

  function wake(): void {
    clearTimeout(timer)
    if (closing.signal.aborted || behaviour.drop) return
    const rows = (next.all(AT_ONCE * 2) as Due[]).filter(row => !underWay.has(row.seq))
    for (const row of rows) {
      if (underWay.size >= AT_ONCE) return
      const wait = row.due_at - Date.now()
      if (wait > 0) {
        timer = setTimeout(wake, wait)
        return
      }
      underWay.set(row.seq, deliver(row))
    }
  }

  async function deliver(row: Due): Promise<void> {
    const outcome = await post(row.event_id)
    underWay.delete(row.seq)
    // A try that was cut off by our own stop does not count: it is made again after the next start.
    if (closing.signal.aborted) return
    const tries = row.attempts + 1
    const state = outcome.delivered ? 'delivered' : tries >= MOST_TRIES ? 'given_up' : 'pending'
    mark.run(state, tries, Date.now() + waitAfter(tries), outcome.answer, row.seq)
    waiting.get(row.seq)?.(outcome)
    wake()
  }

  async function post(eventId: string): Promise<Outcome> {
    const event = books.find('event', eventId)
    if (!event) return { delivered: true, answer: 'forgotten' }
    const body = JSON.stringify(event, null, 2)
    try {
      const response = await fetch(typeof options.url === 'string' ? options.url : options.url(), {
        method: 'POST',
        redirect: 'manual',
        headers: {
          'content-type': 'application/json; charset=utf-8',
          'user-agent': 'Payment stand-in',
          'stripe-signature': signatureOf(body, options.secret, Math.floor(options.now() / 1000)),
        },
        body,
        signal: AbortSignal.any([closing.signal, AbortSignal.timeout(ANSWER_LIMIT_MS)]),
      })
      await response.arrayBuffer()
      return { delivered: response.ok, answer: String(response.status) }
    } catch (error) {
      const cause = error instanceof Error ? (error.cause ?? error) : error
      return { delivered: false, answer: cause instanceof Error ? cause.message : String(cause) }
    }
  }

  return {
    /** Puts an event in the queue, as often and as late as the behaviour asks. */
    queue(eventId: string): void {
      for (let copy = 0; copy <= behaviour.duplicate; copy++) {
        const hold = behaviour.shuffle ? Math.floor(Math.random() * LONGEST_HOLD_MS) : 0
        insert.run(eventId, Date.now() + behaviour.delayMs + hold)
      }
      // After the transaction that wrote it is committed, not in the midst of it.
      setImmediate(wake)
    },
    /** Sends an event once more, now. Resolves with what came of the first try; a failed one is tried again later. */
    resend(eventId: string): Promise<Outcome> {
      const seq = Number(insert.run(eventId, 0).lastInsertRowid)
      if (behaviour.drop) return Promise.resolve({ delivered: false, answer: 'held back: drop is on' })
      return new Promise(resolve => {
        waiting.set(seq, outcome => {
          waiting.delete(seq)
          resolve(outcome)
        })
        wake()
      })
    },
    deliveriesOf: (eventId: string) =>
      ofEvent.all(eventId) as { state: string; attempts: number; last_answer: string | null }[],
    wake,
    async close(): Promise<void> {
      clearTimeout(timer)
      closing.abort()
      await Promise.all(underWay.values())
      for (const tell of [...waiting.values()]) tell({ delivered: false, answer: 'the stand-in stopped' })
    },
  }
}
