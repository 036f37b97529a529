import type { Logger } from 'pino'
import { makeMailer } from './clients/mail.ts'
import { makePayments } from './clients/payments.ts'
import type { Now } from './clock.ts'
import type { Config } from './config.ts'
import type { Db } from './db/open.ts'
import type { Deps } from './deps.ts'
import { makeIdentity } from './people/identity.ts'
import { makeIdentityMail } from './people/identity-mail.ts'

/** Builds what operations need from the configuration and an open database. */
export function makeDeps(from: { config: Config; db: Db; log: Logger; now: Now }): Deps {
  return {
    ...from,
    payments: makePayments(from.config, from.now),
    mailer: makeMailer(from.config),
    identity: makeIdentity(from.config, from.db, makeIdentityMail(from.db, from.now)),
  }
}
