import { cpSync, mkdtempSync, readdirSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { expect, test } from 'vitest'
import { migrationsDir } from '../paths.ts'
import { freshDatabase } from '../testing/start-app.ts'
import { isMigrated, migrate } from './migrate.ts'
import { openDb } from './open.ts'
import { inTransaction } from './transaction.ts'

const scratch = () => mkdtempSync(join(tmpdir(), 'tallykin-db-'))

test('every open of the file is durable, the first and each one after', () => {
  const file = join(scratch(), 'a.sqlite')
  for (let n = 0; n < 3; n++) {
    const db = openDb(file)
    expect(db.raw.pragma('synchronous', { simple: true })).toBe(2)
    expect(db.raw.pragma('journal_mode', { simple: true })).toBe('wal')
    expect(db.raw.pragma('foreign_keys', { simple: true })).toBe(1)
    db.raw.close()
  }
})

test('SQLite is new enough not to lose its log with two connections (fixed in 3.51.3, sqlite.org/wal.html)', () => {
  const db = openDb(join(scratch(), 'a.sqlite'))
  const { v } = db.raw.prepare('select sqlite_version() as v').get() as { v: string }
  const [major, minor, patch] = v.split('.').map(Number) as [number, number, number]
  expect(major * 1e6 + minor * 1e3 + patch).toBeGreaterThanOrEqual(3_051_003)
  db.raw.close()
})

test('every table is strict', () => {
  const db = openDb(freshDatabase().file)
  const loose = db.raw
    .prepare(
      "select name from pragma_table_list where schema = 'main' and type = 'table' and strict = 0 and name not like 'sqlite_%'",
    )
    .all()
  expect(loose).toEqual([])
  db.raw.close()
})

test('a transaction refuses to nest and rolls back what threw', () => {
  const db = openDb(freshDatabase().file)
  expect(() => inTransaction(db, () => inTransaction(db, () => 1))).toThrow(/already open/)
  const insert = db.raw.prepare("insert into ledger_account (code, kind) values ('x', 'asset')")
  expect(() =>
    inTransaction(db, () => {
      insert.run()
      throw new Error('after the write')
    }),
  ).toThrow('after the write')
  expect(db.raw.prepare("select * from ledger_account where code = 'x'").all()).toEqual([])
  db.raw.close()
})

test('a promise cannot be given back from a transaction', () => {
  const db = openDb(freshDatabase().file)
  // @ts-expect-error the type refuses it; the driver does too
  expect(() => inTransaction(db, async () => 1)).toThrow(/promise/)
  db.raw.close()
})

test('ledger entries, terms and the activity log are never changed', () => {
  const db = openDb(freshDatabase().file)
  db.raw.pragma('foreign_keys = OFF')
  db.raw.exec(
    "insert into ledger_journal (id, drive_id, kind, subject, at) values (1, 1, 'order_paid', 's', 1)",
  )
  db.raw.exec(
    "insert into ledger_entry (journal_id, drive_id, debit, credit, amount_cents) values (1, 1, 'cash_operator', 'sales', 5)",
  )
  db.raw.exec("insert into activity (at, actor, action, subject) values (1, 'a', 'b', 'c')")
  for (const statement of [
    'update ledger_entry set amount_cents = 6',
    'delete from ledger_entry',
    'update ledger_journal set at = 2',
    'delete from ledger_journal',
    "update activity set action = 'x'",
  ])
    expect(() => db.raw.exec(statement), statement).toThrow(/never/)
  db.raw.close()
})

test.each([
  ['a fraction of a cent', '5.5'],
  ['nothing', '0'],
  ['a negative amount', '-5'],
  ['a text', "'12abc'"],
])('the ledger takes no entry of %s', (_what, amount) => {
  const db = openDb(freshDatabase().file)
  db.raw.pragma('foreign_keys = OFF')
  const entry = `insert into ledger_entry (journal_id, drive_id, debit, credit, amount_cents) values (1, 1, 'cash_operator', 'sales', ${amount})`
  expect(() => db.raw.exec(entry)).toThrow()
  db.raw.close()
})

test('migrating is repeatable, notices an edited step and never loses a row', () => {
  const dir = scratch()
  const steps = join(dir, 'steps')
  cpSync(migrationsDir, steps, { recursive: true })
  const db = openDb(join(dir, 'a.sqlite'))
  expect(migrate(db, steps).applied.length).toBeGreaterThan(0)
  expect(migrate(db, steps).applied).toEqual([])
  expect(isMigrated(db, steps)).toBe(true)

  const before = db.raw.prepare('select count(*) as n from ledger_account').get()
  writeFileSync(
    join(steps, '9000_rebuild.sql'),
    'CREATE TABLE ledger_account_new (code text PRIMARY KEY NOT NULL, kind text NOT NULL) STRICT;--> statement-breakpoint\nDROP TABLE ledger_account;--> statement-breakpoint\nALTER TABLE ledger_account_new RENAME TO ledger_account;',
  )
  expect(() => migrate(db, steps)).toThrow(/lose rows of ledger_account/)
  expect(db.raw.prepare('select count(*) as n from ledger_account').get()).toEqual(before)

  const first = readdirSync(steps).find(name => name.startsWith('0000'))!
  writeFileSync(join(steps, first), 'SELECT 1;')
  expect(() => migrate(db, steps)).toThrow(/was changed after it was applied/)
  db.raw.close()
})

test('a populated database of every earlier state migrates to the newest with all its rows', () => {
  const names = readdirSync(migrationsDir)
    .filter(name => name.endsWith('.sql'))
    .sort()
  for (let upTo = 1; upTo <= names.length; upTo++) {
    const dir = scratch()
    const earlier = join(dir, 'earlier')
    cpSync(migrationsDir, earlier, {
      recursive: true,
      filter: path => !path.endsWith('.sql') || names.slice(0, upTo).some(name => path.endsWith(name)),
    })
    const db = openDb(join(dir, 'a.sqlite'))
    migrate(db, earlier)
    db.raw.exec("insert into organization (id, public_id, name, created_at) values (1, 'o', 'Org', 1)")
    db.raw.exec(
      "insert into user (id, name, email, email_verified, created_at, updated_at) values ('u', 'A', 'a@b.co', 1, 1, 1)",
    )
    db.raw.exec(
      "insert into session (id, user_id, token, expires_at, created_at, updated_at) values ('s', 'u', 't', 1, 1, 1)",
    )
    migrate(db, migrationsDir)
    expect(
      db.raw
        .prepare('select (select count(*) from organization) as o, (select count(*) from session) as s')
        .get(),
    ).toEqual({ o: 1, s: 1 })
    expect(db.raw.pragma('foreign_key_check')).toEqual([])
    db.raw.close()
  }
})
