import { randomUUID } from 'node:crypto'
import { sql } from 'drizzle-orm'
import { jobLease } from '../db/schema/activity.ts'
import { inTransaction } from '../db/transaction.ts'
import type { Deps } from '../deps.ts'

const owner = randomUUID()

/** Takes or keeps the turn for a job; false while another process on the same file has it. */
export function takeLease(deps: Deps, name: string, forMs: number): boolean {
  return inTransaction(deps.db, tx => {
    const now = deps.now()
    const { changes } = tx
      .insert(jobLease)
      .values({ name, owner, until: now + forMs })
      .onConflictDoUpdate({
        target: jobLease.name,
        set: { owner, until: now + forMs },
        setWhere: sql`${jobLease.owner} = ${owner} or ${jobLease.until} < ${now}`,
      })
      .run()
    return changes === 1
  })
}
