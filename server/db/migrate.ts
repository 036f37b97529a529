import { createHash } from 'node:crypto'
import { copyFileSync, existsSync, readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import type { Db } from './open.ts'

type Step = { name: string; hash: string; statements: string[] }

/**
 * Brings the database to the newest schema, all or nothing.
 *
 * Foreign keys are switched off before the transaction begins: inside one the switch does nothing, and a
 * rebuilt table would then delete its children's rows. Afterwards every reference is checked and no table
 * that was there before may have lost a row. A migration that was applied and has since been edited, or is
 * gone, stops the start.
 *
 * @throws Error with one sentence that names the migration and what is wrong with it.
 */
export function migrate(db: Db, folder: string): { applied: string[] } {
  db.raw.exec(
    'CREATE TABLE IF NOT EXISTS schema_migration (name TEXT PRIMARY KEY, hash TEXT NOT NULL, at INTEGER NOT NULL) STRICT',
  )
  const steps = readSteps(folder)
  const done = db.raw.prepare('SELECT name, hash FROM schema_migration').all() as {
    name: string
    hash: string
  }[]
  for (const past of done) {
    const step = steps.find(s => s.name === past.name)
    if (!step) throw new Error(`Migration ${past.name} was applied here and is missing from this build`)
    if (step.hash !== past.hash) throw new Error(`Migration ${past.name} was changed after it was applied`)
  }
  const open = steps.filter(step => !done.some(past => past.name === step.name))
  if (open.length === 0) return { applied: [] }
  if (done.length > 0) keepCopy(db)

  const before = rowCounts(db)
  db.raw.pragma('foreign_keys = OFF')
  try {
    db.raw
      .transaction(() => {
        for (const step of open) {
          for (const statement of step.statements) db.raw.exec(statement)
          db.raw
            .prepare('INSERT INTO schema_migration (name, hash, at) VALUES (?, ?, ?)')
            .run(step.name, step.hash, Date.now())
        }
        const broken = db.raw.pragma('foreign_key_check') as unknown[]
        if (broken.length > 0)
          throw new Error(`Migrations would break ${broken.length} references; nothing was changed`)
        const after = rowCounts(db)
        for (const [table, rows] of before)
          if ((after.get(table) ?? rows) < rows)
            throw new Error(`Migrations would lose rows of ${table}; nothing was changed`)
      })
      .immediate()
  } finally {
    db.raw.pragma('foreign_keys = ON')
  }
  return { applied: open.map(step => step.name) }
}

/** True when nothing is left to apply. */
export function isMigrated(db: Db, folder: string): boolean {
  const known = db.raw.prepare("SELECT 1 FROM sqlite_master WHERE name = 'schema_migration'").get()
  if (!known) return false
  const { n } = db.raw.prepare('SELECT count(*) AS n FROM schema_migration').get() as { n: number }
  return n === readSteps(folder).length
}

function readSteps(folder: string): Step[] {
  return readdirSync(folder)
    .filter(file => file.endsWith('.sql'))
    .sort()
    .map(file => {
      const text = readFileSync(join(folder, file), 'utf8')
      return {
        name: file.replace(/\.sql$/, ''),
        hash: createHash('sha256').update(text).digest('hex'),
        statements: text
          .split('--> statement-breakpoint')
          .map(s => s.trim())
          .filter(s => s !== ''),
      }
    })
}

function rowCounts(db: Db): Map<string, number> {
  const tables = db.raw
    .prepare(
      "SELECT name FROM sqlite_master WHERE type = 'table' AND name NOT LIKE 'sqlite_%' AND name <> 'schema_migration'",
    )
    .all() as { name: string }[]
  return new Map(
    tables.map(({ name }) => [
      name,
      (db.raw.prepare(`SELECT count(*) AS n FROM "${name}"`).get() as { n: number }).n,
    ]),
  )
}

/** A copy of the file as it was, beside it; the write-ahead log is folded in first. */
function keepCopy(db: Db) {
  if (db.raw.memory || !existsSync(db.raw.name)) return
  db.raw.pragma('wal_checkpoint(TRUNCATE)')
  copyFileSync(db.raw.name, `${db.raw.name}.before-migration`)
}
