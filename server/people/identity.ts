import { betterAuth } from 'better-auth'
import { drizzleAdapter } from 'better-auth/adapters/drizzle'
import { fromNodeHeaders, toNodeHandler } from 'better-auth/node'
import { magicLink, twoFactor } from 'better-auth/plugins'
import type { Request, RequestHandler } from 'express'
import type { Config } from '../config.ts'
import { type Db, schema } from '../db/open.ts'
import type { Person } from '../http/route.ts'
import { mayUseSignInLink } from './queries.ts'
import { makeRecoveryCodes } from './recovery-codes.ts'
import { withoutCookies } from './request-cookies.ts'
import { secondFactorDoors } from './second-factor-doors.ts'
import { secondFactorGuard } from './second-factor-guard.ts'

/** What identity asks of the rest: to mail somebody a link. Called outside any transaction. */
export type IdentityMail = {
  passwordReset(to: { email: string; name: string }, token: string): void
  /** Answers false for an address whose account may not come in by link. */
  signInLink(email: string, token: string): void
}

export type Identity = ReturnType<typeof makeIdentity>

export const LINK_MINUTES = 10
export const RESET_MINUTES = 10
/** So many wrong codes in a row, and no code is taken for so long. */
export const WRONG_CODES = 5
export const LOCK_MINUTES = 15
export const CLIENT_ADDRESS_HEADER = 'x-tallykin-client'
const DAY_SECONDS = 24 * 60 * 60

/**
 * Sign-in, sessions, password reset and e-mailed links by a well-kept library, fenced in:
 * its adapter never opens transactions on our handle, nobody can sign up by themselves, links are stored
 * hashed and are for families only, sessions are looked up each time (no cookie cache), attempts are counted
 * in the database, per real client address.
 */
export function makeIdentity(config: Config, db: Db, mail: IdentityMail) {
  const auth = betterAuth({
    appName: 'Tallykin',
    baseURL: config.publicUrl,
    basePath: '/api/auth',
    secret: config.authSecret,
    telemetry: { enabled: false },
    logger: { disabled: true },
    database: drizzleAdapter(db.orm, {
      provider: 'sqlite',
      schema: {
        user: schema.user,
        session: schema.session,
        account: schema.account,
        verification: schema.verification,
        twoFactor: schema.twoFactor,
        rateLimit: schema.rateLimit,
      },
      transaction: false,
    }),
    emailAndPassword: {
      enabled: true,
      disableSignUp: true,
      minPasswordLength: 10,
      maxPasswordLength: 128,
      resetPasswordTokenExpiresIn: RESET_MINUTES * 60,
      revokeSessionsOnPasswordReset: true,
      sendResetPassword: async ({ user, token }) =>
        mail.passwordReset({ email: user.email, name: user.name }, token),
    },
    session: { expiresIn: 7 * DAY_SECONDS, updateAge: DAY_SECONDS, freshAge: 15 * 60 },
    rateLimit: {
      enabled: true,
      storage: 'database',
      window: 60,
      max: 600,
      customRules: {
        '/sign-in/email': { window: 60, max: 120 },
        '/sign-in/magic-link': { window: 60, max: 60 },
        '/request-password-reset': { window: 60, max: 60 },
        '/reset-password': { window: 60, max: 60 },
        '/two-factor/*': { window: 60, max: 120 },
        '/get-session': false,
      },
    },
    advanced: {
      ipAddress: { ipAddressHeaders: [CLIENT_ADDRESS_HEADER] },
      useSecureCookies: config.publicUrl.startsWith('https://'),
      cookiePrefix: 'tallykin',
    },
    plugins: [
      magicLink({
        expiresIn: LINK_MINUTES * 60,
        disableSignUp: true,
        storeToken: 'hashed',
        sendMagicLink: async ({ email, token }) => mail.signInLink(email, token),
      }),
      twoFactor({
        issuer: 'Tallykin',
        accountLockout: { maxFailedAttempts: WRONG_CODES, durationSeconds: LOCK_MINUTES * 60 },
        backupCodeOptions: { customBackupCodesGenerate: makeRecoveryCodes },
      }),
    ],
    hooks: { before: secondFactorGuard(db) },
    databaseHooks: {
      session: {
        create: {
          // A link may be older than a role or a factor: asked again when it is used, not only when it is mailed.
          before: async (begun, context) =>
            context?.path !== '/magic-link/verify' || mayUseSignInLink(db.orm, begun.userId),
        },
      },
    },
  })
  const handler = toNodeHandler(auth)

  return {
    /** Everything below /api/auth. The client's address is ours to state, never the client's. */
    handler: ((req, res, next) => {
      req.headers[CLIENT_ADDRESS_HEADER] = req.ip ?? ''
      // A code typed at the door is for coming in; with a session beside it, the library would take it for a
      // set-up and neither count nor lock.
      if (req.path.toLowerCase().includes('/two-factor/'))
        req.headers.cookie = withoutCookies(req.headers.cookie, ['session_token', 'session_data'])
      handler(req, res).catch(next)
    }) satisfies RequestHandler,

    async findPerson(req: Request): Promise<Person | null> {
      if (!req.headers.cookie?.includes('tallykin.session_token')) return null
      const found = await auth.api.getSession({ headers: fromNodeHeaders(req.headers) })
      if (!found) return null
      return {
        userId: found.user.id,
        name: found.user.name,
        email: found.user.email,
        sessionId: found.session.id,
      }
    },

    /** Uses up a mailed sign-in link; the cookies to set, or null when the link is no good any more. */
    async consumeSignInLink(req: Request, token: string): Promise<string[] | null> {
      const answer = await auth.api.magicLinkVerify({
        query: { token },
        headers: fromNodeHeaders(req.headers),
        asResponse: true,
      })
      const cookies = answer.headers.getSetCookie()
      return cookies.some(cookie => cookie.includes('session_token=')) ? cookies : null
    },

    async endOtherSessions(req: Request) {
      await auth.api.revokeOtherSessions({ headers: fromNodeHeaders(req.headers) })
    },

    secondFactor: secondFactorDoors(auth),

    async hashPassword(password: string): Promise<string> {
      const context = await auth.$context
      return context.password.hash(password)
    },
  }
}
