import { and, asc, eq, lte, or, sql } from 'drizzle-orm'
import { outbox } from '../db/schema/mail.ts'
import { inTransaction } from '../db/transaction.ts'
import type { Deps } from '../deps.ts'
import { hit } from '../faults.ts'
import { renderLetter } from './render-letter.ts'

/** How long a claimed letter is ours; a worker that died with it loses it to the next after that. */
const LEASE_MS = 60_000
const AT_ONCE = 2
const PER_ROUND = 40
/** Waiting times after the first, second, … try that the mail server put off. */
const BACK_OFF_MS = [2_000, 10_000, 60_000, 300_000, 900_000, 3_600_000, 4 * 3_600_000, 24 * 3_600_000]
/** After this many tries a letter is left for staff. */
const MAX_ATTEMPTS = 12

type OutboxRow = typeof outbox.$inferSelect

/** Sends what the outbox holds: claims a letter, sends it, notes the mail server's answer. */
export function makeMailWorker(deps: Deps) {
  let running: Promise<void> | null = null
  return {
    /** Sends everything that is due now; a second call joins the one under way. */
    round(): Promise<void> {
      running ??= sendDue(deps).finally(() => {
        running = null
      })
      return running
    },
    async stop() {
      await running
    },
  }
}

async function sendDue(deps: Deps) {
  for (;;) {
    const due = deps.db.orm
      .select({ id: outbox.id })
      .from(outbox)
      .where(and(isDue(deps.now()), lte(outbox.nextAttemptAt, deps.now())))
      .orderBy(asc(outbox.nextAttemptAt))
      .limit(PER_ROUND)
      .all()
    if (due.length === 0) return
    let sent = 0
    for (let at = 0; at < due.length; at += AT_ONCE) {
      const done = await Promise.all(due.slice(at, at + AT_ONCE).map(({ id }) => sendOne(deps, id)))
      sent += done.filter(Boolean).length
    }
    // Nothing went out although letters are due: the mail server is away, the next round tries again.
    if (sent === 0) return
  }
}

function isDue(now: number) {
  return or(
    eq(outbox.state, 'waiting'),
    and(eq(outbox.state, 'sending'), sql`coalesce(${outbox.leaseUntil}, 0) < ${now}`),
  )
}

async function sendOne(deps: Deps, id: number): Promise<boolean> {
  const row = claim(deps, id)
  if (!row) return false
  hit('F16')
  try {
    const letter = await renderLetter(deps, row)
    const response = await deps.mailer.send({
      ...letter,
      to: { name: row.recipientName, address: row.recipientEmail },
      messageId: `<${row.messageId}@${deps.config.mail.from.split('@')[1]}>`,
    })
    hit('F19')
    inTransaction(deps.db, tx => {
      tx.update(outbox)
        .set({
          state: 'sent',
          sentAt: deps.now(),
          response: response.slice(0, 300),
          leaseUntil: null,
          lastError: null,
        })
        .where(and(eq(outbox.id, id), eq(outbox.state, 'sending')))
        .run()
    })
    return true
  } catch (error) {
    putOff(deps, row, error as Error & { responseCode?: number })
    return false
  }
}

function claim(deps: Deps, id: number): OutboxRow | null {
  return inTransaction(deps.db, tx => {
    const now = deps.now()
    const { changes } = tx
      .update(outbox)
      .set({ state: 'sending', leaseUntil: now + LEASE_MS, attempts: sql`${outbox.attempts} + 1` })
      .where(and(eq(outbox.id, id), isDue(now)))
      .run()
    if (changes !== 1) return null
    return tx.select().from(outbox).where(eq(outbox.id, id)).get() ?? null
  })
}

/** A refusal for good (5xx) or a template that fails goes to staff; everything else is tried again, later and later. */
function putOff(deps: Deps, row: OutboxRow, error: Error & { responseCode?: number }) {
  const forGood =
    (error.responseCode ?? 0) >= 500 || error.name === 'LetterError' || row.attempts >= MAX_ATTEMPTS
  const wait = BACK_OFF_MS[Math.min(row.attempts - 1, BACK_OFF_MS.length - 1)] ?? 0
  inTransaction(deps.db, tx => {
    tx.update(outbox)
      .set({
        state: forGood ? 'failed' : 'waiting',
        nextAttemptAt: deps.now() + wait,
        leaseUntil: null,
        lastError: error.message.slice(0, 300),
      })
      .where(and(eq(outbox.id, row.id), eq(outbox.state, 'sending')))
      .run()
  })
  // The answer of a mail server may quote the address, so it goes to the row and not to the log.
  deps.log.warn({ letter: row.id, kind: row.kind, code: error.responseCode, forGood }, 'letter not sent')
}
