import type { Request, RequestHandler } from 'express'
import { ipKeyGenerator, rateLimit } from 'express-rate-limit'
import { AppError } from '#shared/errors.ts'
import type { Config } from '../config.ts'

const MINUTE_MS = 60_000

function limiter(options: {
  perMinute: number
  key: (req: Request) => string
  onlyFailed?: boolean
}): RequestHandler {
  return rateLimit({
    windowMs: MINUTE_MS,
    limit: options.perMinute,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    keyGenerator: options.key,
    skipSuccessfulRequests: options.onlyFailed ?? false,
    handler: (_req, _res, next) => next(new AppError('too_many_requests', { retryAfterSeconds: 60 })),
  })
}

const byAddress = (req: Request) => ipKeyGenerator(req.ip ?? '')

/** The account an attempt is for, however its address was typed. */
const byAccount = (req: Request) => {
  const email = (req.body as { email?: unknown } | undefined)?.email
  return typeof email === 'string' ? `account:${email.trim().toLowerCase().slice(0, 254)}` : byAddress(req)
}

/**
 * How often, by what. A whole school behind one address orders and looks on without meeting these; guessing
 * links does not.
 */
export function makeLimits(config: Config) {
  return {
    /** Requests that found nothing at a link or receipt; asked only once that is known. */
    misses: limiter({ perMinute: 30, key: byAddress }),
    /** Orders placed through one link. */
    ordersPerLink: limiter({
      perMinute: config.ordersPerLinkPerMinute,
      key: req => `link:${req.params.token}`,
    }),
    /** Passwords and codes typed by somebody who is signed in. */
    perSession: limiter({
      perMinute: 12,
      key: req =>
        `session:${/tallykin\.session_token=([^;]{1,64})/.exec(req.headers.cookie ?? '')?.[1] ?? byAddress(req)}`,
    }),
    /** Wrong passwords for one account, whoever tries them; signing in rightly never counts. */
    wrongPasswords: limiter({ perMinute: 10, key: byAccount, onlyFailed: true }),
    /** Links and resets asked for one account. */
    lettersPerAccount: limiter({ perMinute: 10, key: byAccount }),
  }
}
