import { eq, sql } from 'drizzle-orm'
import { ledgerAccount, ledgerEntry } from '../db/schema/ledger.ts'
import type { Tx } from '../db/transaction.ts'
import type { Account } from './post-journal.ts'

/** Debits less credits of every account of a drive, in cents; their sum is zero. */
export function trialBalance(tx: Tx, driveId: number): Record<Account, number> {
  const balance = Object.fromEntries(
    tx
      .select({ code: ledgerAccount.code })
      .from(ledgerAccount)
      .all()
      .map(row => [row.code, 0]),
  ) as Record<Account, number>
  const sum = sql<number>`sum(${ledgerEntry.amountCents})`
  const ofDrive = eq(ledgerEntry.driveId, driveId)
  for (const row of tx
    .select({ code: ledgerEntry.debit, sum })
    .from(ledgerEntry)
    .where(ofDrive)
    .groupBy(ledgerEntry.debit)
    .all())
    balance[row.code as Account] += row.sum
  for (const row of tx
    .select({ code: ledgerEntry.credit, sum })
    .from(ledgerEntry)
    .where(ofDrive)
    .groupBy(ledgerEntry.credit)
    .all())
    balance[row.code as Account] -= row.sum
  return balance
}
