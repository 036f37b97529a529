import { sql } from 'drizzle-orm'
import { drive } from './db/schema/drives.ts'
import { outbox } from './db/schema/mail.ts'
import type { Deps } from './deps.ts'

/** A letter that is due this long and not yet tried means that the worker stands still. */
const STANDSTILL_MS = 30_000

export type Readiness = {
  ready: boolean
  seeded: boolean
  outboxMoves: boolean
  mail: boolean
  payments: boolean
}

/** Whether the whole product can do its work now; in the demonstration also whether its data are there. */
export async function isReady(deps: Deps): Promise<Readiness> {
  const seeded =
    deps.config.mode !== 'demo' ||
    deps.db.orm.select({ id: drive.id }).from(drive).limit(1).get() !== undefined
  const stuck = deps.db.orm
    .select({ id: outbox.id })
    .from(outbox)
    .where(sql`${outbox.state} = 'waiting' and ${outbox.nextAttemptAt} < ${deps.now() - STANDSTILL_MS}`)
    .limit(1)
    .get()
  const [mail, payments] =
    deps.config.mode === 'demo' || deps.config.mode === 'development'
      ? await Promise.all([deps.mailer.isReachable(), answers(deps.config.stripe.apiBase)])
      : [true, true]
  const outboxMoves = stuck === undefined
  return { ready: seeded && outboxMoves && mail && payments, seeded, outboxMoves, mail, payments }
}

async function answers(base: string | null): Promise<boolean> {
  if (!base) return true
  try {
    const response = await fetch(new URL('/healthz', base), { signal: AbortSignal.timeout(2_000) })
    return response.ok
  } catch {
    return false
  }
}
