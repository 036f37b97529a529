import { mkdirSync } from 'node:fs'
import { join } from 'node:path'
import Database from 'better-sqlite3'
import type Stripe from 'stripe'

export type Kinds = {
  'checkout.session': Stripe.Checkout.Session
  payment_intent: Stripe.PaymentIntent
  charge: Stripe.Charge
  refund: Stripe.Refund
  event: Stripe.Event
}
export type Kind = keyof Kinds
type Thing = Kinds[Kind]

/** What belongs to a session and is not shown with it: its lines, and what its payment will carry. */
export type Aside = { lines: Stripe.LineItem[]; intentMetadata: Record<string, string> }

export type Filter = {
  createdFrom?: number
  createdTo?: number
  paymentIntent?: string
  charge?: string
  status?: string
  types?: string[]
  email?: string
  /** Only what comes after this one in the list, which runs from the newest to the oldest. */
  after?: string
  limit?: number
}

export type Books = ReturnType<typeof openBooks>

/** The payment service's books: every object as it is shown on the wire, with the columns that lists ask for. */
export function openBooks(dataDir: string) {
  const folder = join(dataDir, 'payment-fake')
  mkdirSync(folder, { recursive: true })
  const db = new Database(join(folder, 'books.sqlite'))
  db.pragma('journal_mode = WAL')
  db.pragma('synchronous = NORMAL')
  db.exec(SCHEMA)

  const insert = db.prepare(
    `INSERT INTO thing (kind, id, created, payment_intent, charge, status, expires_at, type, email, body, aside)
     VALUES (@kind, @id, @created, @payment_intent, @charge, @status, @expires_at, @type, @email, @body, @aside)
     ON CONFLICT (id) DO UPDATE SET created = excluded.created, payment_intent = excluded.payment_intent,
       status = excluded.status, expires_at = excluded.expires_at, body = excluded.body,
       aside = COALESCE(excluded.aside, aside)`,
  )
  const find = db.prepare('SELECT body FROM thing WHERE id = ? AND kind = ?')
  const aside = db.prepare('SELECT aside FROM thing WHERE id = ?')
  const place = db.prepare('SELECT created, seq FROM thing WHERE id = ? AND kind = ?')
  const overdue = db.prepare(
    "SELECT id FROM thing WHERE kind = 'checkout.session' AND status = 'open' AND expires_at <= ? ORDER BY seq",
  )

  return {
    db,
    /** Writes an object down, new or changed. */
    save(thing: Thing, more?: Aside): void {
      insert.run({
        ...columnsOf(thing),
        body: JSON.stringify(thing),
        aside: more ? JSON.stringify(more) : null,
      })
    },
    find<K extends Kind>(kind: K, id: string): Kinds[K] | null {
      const row = find.get(id, kind) as { body: string } | undefined
      return row ? (JSON.parse(row.body) as Kinds[K]) : null
    },
    asideOf(sessionId: string): Aside {
      const row = aside.get(sessionId) as { aside: string | null } | undefined
      return row?.aside ? (JSON.parse(row.aside) as Aside) : { lines: [], intentMetadata: {} }
    },
    /** From the newest to the oldest. One more than the limit tells the caller whether there is another page. */
    list<K extends Kind>(kind: K, filter: Filter = {}): Kinds[K][] {
      const conditions = ['kind = @kind']
      const values: Record<string, string | number> = { kind }
      const where = (sql: string, name: string, value: string | number | undefined) => {
        if (value === undefined) return
        conditions.push(sql)
        values[name] = value
      }
      where('created >= @from', 'from', filter.createdFrom)
      where('created <= @to', 'to', filter.createdTo)
      where('payment_intent = @intent', 'intent', filter.paymentIntent)
      where('charge = @charge', 'charge', filter.charge)
      where('status = @status', 'status', filter.status)
      where('email = @email', 'email', filter.email)
      if (filter.types)
        where('type IN (SELECT value FROM json_each(@types))', 'types', JSON.stringify(filter.types))
      if (filter.after !== undefined) {
        const last = place.get(filter.after, kind) as { created: number; seq: number } | undefined
        if (!last) return []
        conditions.push('(created, seq) < (@lastCreated, @lastSeq)')
        values.lastCreated = last.created
        values.lastSeq = last.seq
      }
      const sql = `SELECT body FROM thing WHERE ${conditions.join(' AND ')} ORDER BY created DESC, seq DESC LIMIT @limit`
      const rows = db.prepare(sql).all({ ...values, limit: filter.limit ?? -1 }) as { body: string }[]
      return rows.map(row => JSON.parse(row.body) as Kinds[K])
    },
    /** Open sessions whose time is up at this Unix second. */
    overdueSessions: (second: number) => (overdue.all(second) as { id: string }[]).map(row => row.id),
    transaction: <T>(work: () => T): T => db.transaction(work)(),
    empty() {
      db.exec('DELETE FROM thing; DELETE FROM delivery; DELETE FROM idempotency')
    },
    close: () => void db.close(),
  }
}

function columnsOf(thing: Thing) {
  const any = thing as unknown as Record<string, unknown>
  const textOrNull = (value: unknown) => (typeof value === 'string' ? value : null)
  const details = any.customer_details as { email?: string | null } | null | undefined
  return {
    kind: thing.object,
    id: thing.id,
    created: thing.created,
    payment_intent: textOrNull(any.payment_intent),
    charge: textOrNull(any.charge),
    status: textOrNull(any.status),
    expires_at: typeof any.expires_at === 'number' ? any.expires_at : null,
    type: textOrNull(any.type),
    email: textOrNull(details?.email),
  }
}

const SCHEMA = `
  CREATE TABLE IF NOT EXISTS thing (
    seq INTEGER PRIMARY KEY AUTOINCREMENT, kind TEXT NOT NULL, id TEXT NOT NULL UNIQUE, created INTEGER NOT NULL,
    payment_intent TEXT, charge TEXT, status TEXT, expires_at INTEGER, type TEXT, email TEXT,
    body TEXT NOT NULL, aside TEXT
  ) STRICT;
  CREATE INDEX IF NOT EXISTS thing_by_time ON thing (kind, created, seq);
  CREATE INDEX IF NOT EXISTS thing_by_intent ON thing (payment_intent) WHERE payment_intent IS NOT NULL;
  CREATE INDEX IF NOT EXISTS open_sessions ON thing (expires_at) WHERE kind = 'checkout.session' AND status = 'open';
  CREATE TABLE IF NOT EXISTS delivery (
    seq INTEGER PRIMARY KEY AUTOINCREMENT, event_id TEXT NOT NULL, due_at INTEGER NOT NULL,
    attempts INTEGER NOT NULL DEFAULT 0, state TEXT NOT NULL DEFAULT 'pending', last_answer TEXT
  ) STRICT;
  CREATE INDEX IF NOT EXISTS delivery_due ON delivery (due_at, seq) WHERE state = 'pending';
  CREATE INDEX IF NOT EXISTS delivery_of_event ON delivery (event_id);
  CREATE TABLE IF NOT EXISTS idempotency (
    key TEXT PRIMARY KEY, endpoint TEXT NOT NULL, fingerprint TEXT NOT NULL, created_at INTEGER NOT NULL,
    status INTEGER NOT NULL, body TEXT NOT NULL
  ) STRICT;
`
