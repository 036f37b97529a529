import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import { drive } from './drives.ts'

/** Who did what, when and why. References only; no name or address of anybody. */
export const activity = sqliteTable(
  'activity',
  {
    id: integer().primaryKey(),
    at: integer().notNull(),
    driveId: integer().references(() => drive.id),
    /** A user's id, or which part of the product acted: 'customer', 'payment_service', 'system'. */
    actor: text().notNull(),
    action: text().notNull(),
    subject: text().notNull(),
    before: text(),
    after: text(),
    reason: text(),
    requestId: text(),
  },
  t => [index('activity_drive').on(t.driveId, t.at), index('activity_subject').on(t.subject, t.at)],
)

/** Whose turn a job is; another process takes over when the time has run out. */
export const jobLease = sqliteTable('job_lease', {
  name: text().primaryKey(),
  owner: text().notNull(),
  until: integer().notNull(),
})
