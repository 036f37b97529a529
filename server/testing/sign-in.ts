import { eq } from 'drizzle-orm'
import { account, secondFactorUse } from '../db/schema/identity.ts'
import { findFactor, needsSecondFactor } from '../people/second-factor.ts'
import { codeOf, stepAt } from '../people/totp.ts'
import type { Answer, TestApp } from './start-app.ts'

export const TEST_PASSWORD = 'a password for tests'

/** The cookies an answer sets, as the next request sends them back; what it takes away is left out. */
export function cookiesOf(answer: Answer): string {
  return answer.headers
    .getSetCookie()
    .filter(cookie => !/max-age=0/i.test(cookie))
    .map(cookie => cookie.split(';')[0])
    .join('; ')
}

/** The first step of signing in: e-mail and password. */
export function enterPassword(app: TestApp, email: string, password = TEST_PASSWORD): Promise<Answer> {
  return app.api.post('/api/auth/sign-in/email', { email, password })
}

/** The code somebody's authenticator shows now, or so many steps of 30 seconds from now. */
export async function codeFor(app: TestApp, userId: string, stepsFromNow = 0): Promise<string> {
  const factor = findFactor(app.deps.db.orm, userId)
  if (!factor) throw new Error('this person has no second factor')
  const secret = await app.deps.identity.secondFactor.open(factor.secret)
  return codeOf(secret, stepAt(Date.now()) + stepsFromNow)
}

/**
 * Signs somebody in over HTTP and answers requests with their cookie. Who lacks a password gets one; who
 * needs a second factor for a role they hold gets one and passes it, unless `secondFactor` is false.
 */
export async function signedIn(
  app: TestApp,
  user: { id: string; email: string },
  options: { secondFactor?: boolean } = {},
) {
  const { orm } = app.deps.db
  if (!orm.select().from(account).where(eq(account.userId, user.id)).get())
    await app.make.password(user.id, TEST_PASSWORD)
  const wanted = options.secondFactor ?? needsSecondFactor(orm, user.id)
  if (wanted && !findFactor(orm, user.id)) await app.make.secondFactor(user.id)

  const first = await enterPassword(app, user.email)
  if (first.status !== 200) throw new Error(`sign-in was refused: ${first.status} ${first.body.message}`)
  let cookie = cookiesOf(first)
  if (first.body.twoFactorRedirect) {
    // A test may sign the same person in more often than the clock has codes.
    orm.delete(secondFactorUse).where(eq(secondFactorUse.userId, user.id)).run()
    const second = await app.api.withCookie(cookie).post('/api/auth/two-factor/verify-totp', {
      code: await codeFor(app, user.id),
    })
    if (second.status !== 200) throw new Error(`the code was refused: ${second.body.code}`)
    cookie = cookiesOf(second)
  }
  return { api: app.api.withCookie(cookie), cookie }
}
