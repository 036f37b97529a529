import { join } from 'node:path'
import { pino } from 'pino'
import { createApp } from '../app.ts'
import { loadConfig } from '../config.ts'
import { openDb } from '../db/open.ts'
import { armFault } from '../faults.ts'
import { startJobs } from '../jobs/start-jobs.ts'
import { makeDeps } from '../make-deps.ts'

// The server without its pages, for tests that kill it: nothing of the client needs to be built for them.
const config = loadConfig(process.env)
if (config.fault) armFault(config.fault)
const log = pino({ level: config.logLevel, base: null })
const db = openDb(join(config.dataDir, 'tallykin.sqlite'))
const deps = makeDeps({ config, db, log, now: Date.now })
createApp(deps, null).listen(config.port)
startJobs(deps)
