import { sql } from 'drizzle-orm'
import { prepared } from '../db/prepared.ts'
import { outbox } from '../db/schema/mail.ts'
import type { Tx } from '../db/transaction.ts'
import { newPublicId } from '../ids.ts'

export type LetterKind =
  | 'receipt'
  | 'guardian_notice'
  | 'sign_in_link'
  | 'password_reset'
  | 'second_factor_reset'
  | 'refund_notice'
  | 'staff_notice'

export type QueuedLetter = {
  kind: LetterKind
  /** What it is about; with kind and recipient at most one letter. */
  subject: string
  to: { name: string; email: string }
  locale: 'en' | 'es'
  facts?: Record<string, unknown>
  at: number
}

const insertLetter = prepared(orm =>
  orm
    .insert(outbox)
    .values({
      kind: sql.placeholder('kind'),
      subject: sql.placeholder('subject'),
      recipient: sql.placeholder('recipient'),
      recipientName: sql.placeholder('recipientName'),
      recipientEmail: sql.placeholder('recipientEmail'),
      locale: sql.placeholder('locale'),
      facts: sql.placeholder('facts'),
      messageId: sql.placeholder('messageId'),
      state: 'waiting',
      nextAttemptAt: sql.placeholder('at'),
      createdAt: sql.placeholder('at'),
    })
    .onConflictDoNothing()
    .prepare(),
)

/**
 * Puts a letter into the outbox, in the transaction of what it tells about. A second letter of the same kind,
 * about the same thing, to the same address is not queued.
 */
export function queueLetter(tx: Tx, letter: QueuedLetter) {
  insertLetter(tx).run({
    kind: letter.kind,
    subject: letter.subject,
    recipient: letter.to.email.toLowerCase(),
    recipientName: letter.to.name,
    recipientEmail: letter.to.email,
    locale: letter.locale,
    facts: JSON.stringify(letter.facts ?? {}),
    messageId: newPublicId(),
    at: letter.at,
  })
}
