import { sql } from 'drizzle-orm'
import { prepared } from '../db/prepared.ts'
import { ledgerEntry, ledgerJournal } from '../db/schema/ledger.ts'
import type { Tx } from '../db/transaction.ts'

/**
 * The chart of accounts. Cash is kept by holder: card money is with the operator, paper money with the
 * organization.
 */
export type Account =
  | 'cash_operator'
  | 'cash_organization'
  | 'receivables'
  | 'sales'
  | 'gifts'
  | 'tax'
  | 'cover'
  | 'refunds'
  | 'card_fees'

export type Entry = { debit: Account; credit: Account; amountCents: number }

export type Journal = {
  driveId: number
  kind: 'order_paid' | 'refund'
  /** What the money event is about; a kind and subject are posted once and never again. */
  subject: string
  at: number
  entries: Entry[]
}

const insertJournal = prepared(orm =>
  orm
    .insert(ledgerJournal)
    .values({
      driveId: sql.placeholder('driveId'),
      kind: sql.placeholder('kind'),
      subject: sql.placeholder('subject'),
      at: sql.placeholder('at'),
    })
    .returning({ id: ledgerJournal.id })
    .prepare(),
)

const insertEntry = prepared(orm =>
  orm
    .insert(ledgerEntry)
    .values({
      journalId: sql.placeholder('journalId'),
      driveId: sql.placeholder('driveId'),
      debit: sql.placeholder('debit'),
      credit: sql.placeholder('credit'),
      amountCents: sql.placeholder('amountCents'),
    })
    .prepare(),
)

/** Posts one event of money. Entries of nothing are left out; the database refuses a second posting. */
export function postJournal(tx: Tx, journal: Journal) {
  const { id } = insertJournal(tx).get({
    driveId: journal.driveId,
    kind: journal.kind,
    subject: journal.subject,
    at: journal.at,
  })
  for (const entry of journal.entries)
    if (entry.amountCents > 0) insertEntry(tx).run({ journalId: id, driveId: journal.driveId, ...entry })
}
