import { sql } from 'drizzle-orm'
import { check, index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'

/** Mail to be sent, written in the transaction of what it is about; the worker sends and marks. */
export const outbox = sqliteTable(
  'outbox',
  {
    id: integer().primaryKey(),
    kind: text().notNull(),
    subject: text().notNull(),
    /** Whom: the address in lower case. */
    recipient: text().notNull(),
    recipientName: text().notNull(),
    recipientEmail: text().notNull(),
    locale: text().notNull(),
    /** Facts the template needs that the subject's own rows no longer tell. */
    facts: text().notNull(),
    /** The same at every try, so that a mail program can see a repeat. */
    messageId: text().notNull().unique(),
    state: text().notNull(),
    attempts: integer().notNull().default(0),
    nextAttemptAt: integer().notNull(),
    leaseUntil: integer(),
    createdAt: integer().notNull(),
    sentAt: integer(),
    response: text(),
    lastError: text(),
  },
  t => [
    uniqueIndex('outbox_once').on(t.kind, t.subject, t.recipient),
    index('outbox_due').on(t.nextAttemptAt).where(sql`${t.state} in ('waiting', 'sending')`),
    index('outbox_failed').on(t.createdAt).where(sql`${t.state} = 'failed'`),
    check('outbox_state', sql`${t.state} in ('waiting', 'sending', 'sent', 'failed')`),
    check(
      'outbox_sent',
      sql`(${t.state} = 'sent') = (${t.sentAt} is not null and ${t.response} is not null)`,
    ),
  ],
)
