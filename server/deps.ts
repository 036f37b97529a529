import type { Logger } from 'pino'
import type { Mailer } from './clients/mail.ts'
import type { Payments } from './clients/payments.ts'
import type { Now } from './clock.ts'
import type { Config } from './config.ts'
import type { Db } from './db/open.ts'
import type { Identity } from './people/identity.ts'

/** Everything an operation may need, built once in main.ts and once per test. */
export type Deps = {
  config: Config
  db: Db
  now: Now
  log: Logger
  payments: Payments
  mailer: Mailer
  identity: Identity
}
