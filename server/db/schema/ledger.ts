import { sql } from 'drizzle-orm'
import { check, index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import { drive } from './drives.ts'

export const ledgerAccount = sqliteTable('ledger_account', {
  code: text().primaryKey(),
  kind: text().notNull(),
})

/** One event of money; its entries balance because each is one debit, one credit and one amount. */
export const ledgerJournal = sqliteTable(
  'ledger_journal',
  {
    id: integer().primaryKey(),
    driveId: integer()
      .notNull()
      .references(() => drive.id),
    kind: text().notNull(),
    /** What it is about, e.g. an order's or a refund's public id; with `kind` at most once. */
    subject: text().notNull(),
    at: integer().notNull(),
  },
  t => [
    uniqueIndex('ledger_journal_once').on(t.kind, t.subject),
    index('ledger_journal_drive').on(t.driveId, t.at),
  ],
)

export const ledgerEntry = sqliteTable(
  'ledger_entry',
  {
    id: integer().primaryKey(),
    journalId: integer()
      .notNull()
      .references(() => ledgerJournal.id),
    driveId: integer()
      .notNull()
      .references(() => drive.id),
    debit: text()
      .notNull()
      .references(() => ledgerAccount.code),
    credit: text()
      .notNull()
      .references(() => ledgerAccount.code),
    amountCents: integer().notNull(),
  },
  t => [
    index('ledger_entry_journal').on(t.journalId),
    index('ledger_entry_debit').on(t.driveId, t.debit, t.amountCents),
    index('ledger_entry_credit').on(t.driveId, t.credit, t.amountCents),
    check('ledger_entry_positive', sql`${t.amountCents} > 0 and ${t.amountCents} < 1000000000000`),
    check('ledger_entry_two_sides', sql`${t.debit} <> ${t.credit}`),
  ],
)
