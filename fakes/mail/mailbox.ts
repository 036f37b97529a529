import { randomUUID } from 'node:crypto'
import { mkdirSync } from 'node:fs'
import { join } from 'node:path'
import Database from 'better-sqlite3'

/** A letter as it was caught. `to` and `from` are bare addresses, `date` the instant of arrival. */
export type Message = {
  id: string
  to: string
  from: string
  subject: string
  date: string
  text: string
  html: string
  headers: Record<string, string>
  attachments: { name: string; type: string; bytes: number }[]
}
export type MessageLine = Pick<Message, 'id' | 'to' | 'subject' | 'date'>
/** Something the demonstration wants to say beside the mail, such as the codes of its accounts. */
export type Note = { title: string; rows: { label: string; value: string }[] }

export type Mailbox = ReturnType<typeof openMailbox>

/** What was caught, kept in a file so that it is there after a restart. */
export function openMailbox(dataDir: string) {
  const folder = join(dataDir, 'mail-fake')
  mkdirSync(folder, { recursive: true })
  const db = new Database(join(folder, 'mail.sqlite'))
  db.pragma('journal_mode = WAL')
  db.pragma('synchronous = NORMAL')
  db.exec(SCHEMA)
  const insert = db.prepare(
    'INSERT INTO message (id, recipient, subject, date, body) VALUES (@id, @to, @subject, @date, @body)',
  )
  const all = db.prepare('SELECT body FROM message ORDER BY seq DESC')
  const newest = db.prepare(
    'SELECT id, recipient AS "to", subject, date FROM message ORDER BY seq DESC LIMIT ?',
  )
  const one = db.prepare('SELECT body FROM message WHERE id = ?')
  const count = db.prepare('SELECT count(*) FROM message').pluck()
  const putNote = db.prepare(
    'INSERT INTO note (title, body) VALUES (?, ?) ON CONFLICT (title) DO UPDATE SET body = excluded.body',
  )
  const notes = db.prepare('SELECT body FROM note ORDER BY seq')

  return {
    add(caught: Omit<Message, 'id'>): Message {
      const message = { id: randomUUID(), ...caught }
      insert.run({ ...message, headers: null, attachments: null, body: JSON.stringify(message) })
      return message
    },
    /** Every letter, newest first. */
    list: () => (all.all() as { body: string }[]).map(row => JSON.parse(row.body) as Message),
    newest: (limit: number) => newest.all(limit) as MessageLine[],
    count: () => count.get() as number,
    find(id: string): Message | null {
      const row = one.get(id) as { body: string } | undefined
      return row ? (JSON.parse(row.body) as Message) : null
    },
    empty: () => void db.exec('DELETE FROM message'),
    /** A note of the same title takes the place of the earlier one. */
    putNote: (note: Note) => void putNote.run(note.title, JSON.stringify(note)),
    notes: () => (notes.all() as { body: string }[]).map(row => JSON.parse(row.body) as Note),
    close: () => void db.close(),
  }
}

const SCHEMA = `
  CREATE TABLE IF NOT EXISTS message (
    seq INTEGER PRIMARY KEY AUTOINCREMENT, id TEXT NOT NULL UNIQUE, recipient TEXT NOT NULL,
    subject TEXT NOT NULL, date TEXT NOT NULL, body TEXT NOT NULL
  ) STRICT;
  CREATE TABLE IF NOT EXISTS note (
    seq INTEGER PRIMARY KEY AUTOINCREMENT, title TEXT NOT NULL UNIQUE, body TEXT NOT NULL
  ) STRICT;
`
