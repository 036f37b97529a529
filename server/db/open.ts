import Database from 'better-sqlite3'
import { type BetterSQLite3Database, drizzle } from 'drizzle-orm/better-sqlite3'
import * as activity from './schema/activity.ts'
import * as catalogs from './schema/catalogs.ts'
import * as drives from './schema/drives.ts'
import * as identity from './schema/identity.ts'
import * as ledger from './schema/ledger.ts'
import * as mail from './schema/mail.ts'
import * as orders from './schema/orders.ts'
import * as payments from './schema/payments.ts'
import * as people from './schema/people.ts'
import * as sellers from './schema/sellers.ts'

export const schema = {
  ...activity,
  ...catalogs,
  ...drives,
  ...identity,
  ...ledger,
  ...mail,
  ...orders,
  ...payments,
  ...people,
  ...sellers,
}

/** The one write handle. Domain code reads through `orm` and writes only inside `inTransaction`. */
export type Db = { raw: Database.Database; orm: BetterSQLite3Database<typeof schema> }

/** How long a statement waits for another process's lock; it blocks the event loop, so not long. */
const BUSY_TIMEOUT_MS = 2_000

/**
 * Opens the database file so that a commit survives a power cut.
 *
 * SQLite in WAL mode, as built into the driver, falls back to `synchronous=NORMAL` on every open but the
 * first, which loses acknowledged orders when the power goes. So it is set and read back each time, and a
 * file that does not take it is not used.
 */
export function openDb(file: string): Db {
  const raw = new Database(file, { timeout: BUSY_TIMEOUT_MS })
  raw.pragma('journal_mode = WAL')
  raw.pragma('synchronous = FULL')
  raw.pragma('foreign_keys = ON')
  raw.pragma('cache_size = -65536')
  const synchronous = raw.pragma('synchronous', { simple: true })
  const journal = raw.pragma('journal_mode', { simple: true })
  const foreignKeys = raw.pragma('foreign_keys', { simple: true })
  if (synchronous !== 2 || foreignKeys !== 1 || journal !== 'wal') {
    raw.close()
    throw new Error(
      `The database does not hold its promises: synchronous=${synchronous}, journal=${journal}, foreign_keys=${foreignKeys}`,
    )
  }
  return { raw, orm: drizzle(raw, { schema, casing: 'snake_case' }) }
}
