import { timingSafeEqual } from 'node:crypto'
import express, { type Express } from 'express'
import { AppError } from '#shared/errors.ts'
import type { Deps } from './deps.ts'
import { errorHandler } from './http/errors.ts'
import { makeLimits } from './http/limits.ts'
import { mountRoutes } from './http/mount.ts'
import { toOpenApi } from './http/openapi.ts'
import { mountPages, type PageBuild } from './http/pages.ts'
import { requestLog } from './http/request-log.ts'
import { refuseCrossSite } from './http/same-origin.ts'
import { securityHeaders } from './http/security.ts'
import { mountStatic } from './http/static.ts'
import { isReady } from './readiness.ts'
import { routes } from './routes.ts'

/** The whole HTTP surface: what main starts and what the tests start. `pages` null serves the API alone. */
export function createApp(deps: Deps, pages: PageBuild | null): Express {
  const app = express()
  app.disable('x-powered-by')
  app.set('etag', false)
  app.set('trust proxy', deps.config.trustProxyHops)
  app.use(requestLog(deps.log))
  app.use(securityHeaders(deps.config))
  const host = new URL(deps.config.publicUrl).host
  if (deps.config.mode === 'production')
    app.use((req, res, next) => {
      // A foreign Host would end up in nothing we build, but is a sign of a request meant for somebody else.
      if (!req.path.startsWith('/healthz') && !sameText(req.headers.host ?? '', host)) res.status(421).end()
      else next()
    })

  app.get('/healthz', (_req, res) => void res.type('text/plain').send('ok'))
  app.get('/readyz', async (_req, res) => {
    const state = await isReady(deps)
    res.status(state.ready ? 200 : 503).json(state)
  })

  const limits = makeLimits(deps.config)
  app.post('/api/stores/:token/orders', limits.ordersPerLink)
  app.post(['/api/account/second-factor', '/api/account/second-factor/{*rest}'], limits.perSession)
  mountIdentity(app, deps, limits)

  const description = JSON.stringify(toOpenApi(routes))
  app.get('/api/openapi.json', (_req, res) => void res.type('application/json').send(description))
  mountRoutes(app, deps, routes)
  app.all(['/api', '/api/{*rest}'], () => {
    throw new AppError('not_found')
  })

  if (pages) {
    mountStatic(app, deps, pages)
    mountPages(app, deps, pages, limits.misses)
  }
  app.use(() => {
    throw new AppError('not_found')
  })
  // Links are guessed here or nowhere. Only what finds nothing counts, and only that is put off: whoever has a
  // good link orders on, also from behind the address of somebody who guesses.
  app.use(['/api/stores', '/api/receipts'], countMisses(limits.misses))
  app.use(errorHandler(deps.log))
  return app
}

function countMisses(misses: express.RequestHandler): express.ErrorRequestHandler {
  return (error, req, res, next) => {
    if (!(error instanceof AppError) || error.code !== 'not_found') return next(error)
    return misses(req, res, limited => next(limited ?? error))
  }
}

/** What of the sign-in library is ours to offer; the rest of it (other factors, lists of sessions) stays shut. */
const identityPaths = [
  '/sign-in/email',
  '/sign-in/magic-link',
  '/two-factor/verify-totp',
  '/two-factor/verify-backup-code',
  '/request-password-reset',
  '/reset-password',
  '/change-password',
  '/sign-out',
  '/get-session',
].map(path => `/api/auth${path}`)

/**
 * The sign-in library's own routes. It reads the body itself, so ours is read first only to know the account
 * the attempt is for, and handed on untouched.
 */
function mountIdentity(app: Express, deps: Deps, limits: ReturnType<typeof makeLimits>) {
  app.use('/api/auth', (req, _res, next) => {
    if (req.method !== 'GET' && req.method !== 'HEAD') refuseCrossSite(req, deps.config, 'signed_in')
    next()
  })
  const readAccount = express.json({ limit: '4kb' })
  app.post('/api/auth/sign-in/email', readAccount, limits.wrongPasswords)
  app.post(
    ['/api/auth/sign-in/magic-link', '/api/auth/request-password-reset'],
    readAccount,
    limits.lettersPerAccount,
  )
  // A mail scanner follows links, so using up a link is not among these: the button on our own page does it.
  app.all(identityPaths, deps.identity.handler)
}

function sameText(a: string, b: string): boolean {
  const [left, right] = [Buffer.from(a), Buffer.from(b)]
  return left.length === right.length && timingSafeEqual(left, right)
}
