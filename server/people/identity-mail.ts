import { eq, sql } from 'drizzle-orm'
import type { Db } from '../db/open.ts'
import { user } from '../db/schema/identity.ts'
import { outbox } from '../db/schema/mail.ts'
import { inTransaction } from '../db/transaction.ts'
import { newPublicId } from '../ids.ts'
import { queueLetter } from '../mail/queue-letter.ts'
import type { IdentityMail } from './identity.ts'
import { findUserByEmail, mayUseSignInLink } from './queries.ts'

/** Letters of one kind to one address within an hour; more are not sent, so that nobody can be flooded. */
const PER_HOUR = 5

/** Queues the letters identity asks for. The answer to the visitor is the same whether one goes out or not. */
export function makeIdentityMail(db: Db, now: () => number): IdentityMail {
  const queue = (
    kind: 'password_reset' | 'sign_in_link',
    to: { email: string; name: string },
    token: string,
  ) => {
    inTransaction(db, tx => {
      const recent = tx
        .select({ n: sql<number>`count(*)` })
        .from(outbox)
        .where(
          sql`${outbox.kind} = ${kind} and ${outbox.recipient} = ${to.email.toLowerCase()} and ${outbox.createdAt} > ${now() - 3_600_000}`,
        )
        .get()
      if ((recent?.n ?? 0) >= PER_HOUR) return
      queueLetter(tx, {
        kind,
        subject: `${kind}:${newPublicId()}`,
        to,
        locale: 'en',
        facts: { token },
        at: now(),
      })
    })
  }
  return {
    passwordReset: (to, token) => queue('password_reset', to, token),
    signInLink(email, token) {
      const person = findUserByEmail(db.orm, email)
      if (!person || !mayUseSignInLink(db.orm, person.id)) return
      const { name } = db.orm.select({ name: user.name }).from(user).where(eq(user.id, person.id)).get()!
      queue('sign_in_link', { email, name }, token)
    },
  }
}
