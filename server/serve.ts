import { mkdirSync } from 'node:fs'
import { join } from 'node:path'
import { pino } from 'pino'
import { createApp } from './app.ts'
import { makeClock } from './clock.ts'
import { type Config, loadConfig } from './config.ts'
import { migrate } from './db/migrate.ts'
import { openDb } from './db/open.ts'
import { armFault } from './faults.ts'
import { loadPages } from './http/load-pages.ts'
import { startJobs } from './jobs/start-jobs.ts'
import { makeDeps } from './make-deps.ts'
import { migrationsDir } from './paths.ts'

const EXIT_WITHIN_MS = 9_000

function readConfigOrExit(): Config {
  try {
    return loadConfig(process.env)
  } catch (error) {
    process.stderr.write(`Tallykin cannot start:\n${(error as Error).message}\n`)
    process.exit(2)
  }
}

const config = readConfigOrExit()
if (config.fault) armFault(config.fault)
const log = pino({ level: config.logLevel, base: null })

// Installed before anything opens: a signal during the start must not leave a half-open file behind.
let shutDown: (() => Promise<void>) | null = null
let stopping = false
async function stop(why: string, code: number) {
  if (stopping) return
  stopping = true
  log.info({ why }, 'stopping')
  setTimeout(() => process.exit(code || 1), EXIT_WITHIN_MS).unref()
  await shutDown?.()
  process.exit(code)
}
for (const signal of ['SIGINT', 'SIGTERM'] as const) process.on(signal, () => void stop(signal, 0))
process.on('disconnect', () => void stop('parent gone', 0))
for (const event of ['uncaughtException', 'unhandledRejection'] as const)
  process.on(event, (error: unknown) => {
    log.fatal({ event, error: (error as Error)?.message, stack: (error as Error)?.stack }, 'last resort')
    void stop(event, 1)
  })

mkdirSync(config.dataDir, { recursive: true })
const db = openDb(join(config.dataDir, 'tallykin.sqlite'))
const { applied } = migrate(db, migrationsDir)
if (applied.length > 0) log.info({ applied }, 'migrated')
const deps = makeDeps({ config, db, log, now: makeClock(config.startsAt) })
const pages = await loadPages(config)
const app = createApp(deps, pages.build)
const server = app.listen(config.port, error => {
  if (error) {
    process.stderr.write(`Tallykin cannot start:\nPORT ${config.port}: ${error.message}\n`)
    process.exit(2)
  }
  log.info({ port: config.port, mode: config.mode }, 'listening')
  process.send?.({ ready: true })
})
server.headersTimeout = 15_000
server.requestTimeout = 30_000
server.keepAliveTimeout = 5_000
server.maxRequestsPerSocket = 1_000
pages.attach?.(server)
const jobs = startJobs(deps)

shutDown = async () => {
  const closed = new Promise<void>(resolve => server.close(() => resolve()))
  const hurry = setInterval(() => server.closeIdleConnections(), 50)
  await Promise.all([closed, jobs.stop()])
  clearInterval(hurry)
  await pages.close?.()
  deps.mailer.close()
  db.raw.pragma('wal_checkpoint(TRUNCATE)')
  db.raw.close()
}
