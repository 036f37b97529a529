import { sql } from 'drizzle-orm'
import { prepared } from '../db/prepared.ts'
import { activity } from '../db/schema/activity.ts'
import type { Tx } from '../db/transaction.ts'

export type Activity = {
  at: number
  driveId: number | null
  /** A user's id, or the part of the product that acted. */
  actor: string
  action: string
  /** What it is about, e.g. `order:<public id>`. */
  subject: string
  before?: unknown
  after?: unknown
  reason?: string | undefined
  requestId?: string | undefined
}

const insertActivity = prepared(orm =>
  orm
    .insert(activity)
    .values({
      at: sql.placeholder('at'),
      driveId: sql.placeholder('driveId'),
      actor: sql.placeholder('actor'),
      action: sql.placeholder('action'),
      subject: sql.placeholder('subject'),
      before: sql.placeholder('before'),
      after: sql.placeholder('after'),
      reason: sql.placeholder('reason'),
      requestId: sql.placeholder('requestId'),
    })
    .prepare(),
)

/** Writes down who did what, in the transaction that does it. Facts only: no name, no address. */
export function logActivity(tx: Tx, entry: Activity) {
  insertActivity(tx).run({
    at: entry.at,
    driveId: entry.driveId,
    actor: entry.actor,
    action: entry.action,
    subject: entry.subject,
    before: entry.before === undefined ? null : JSON.stringify(entry.before),
    after: entry.after === undefined ? null : JSON.stringify(entry.after),
    reason: entry.reason ?? null,
    requestId: entry.requestId ?? null,
  })
}
