import type { Request } from 'express'
import { AppError } from '#shared/errors.ts'
import type { Config } from '../config.ts'
import type { Access } from './route.ts'

/**
 * Refuses a state-changing request that another site made the visitor's browser send.
 *
 * The browser's own statement (Fetch Metadata) decides first, the Origin second. A client that sends
 * neither is no browser: it may order through a link it knows, but never use somebody's sign-in.
 */
export function refuseCrossSite(req: Request, config: Config, who: Access['who']) {
  if (who === 'payment_service') return
  const site = req.get('sec-fetch-site')
  if (site !== undefined) {
    if (site === 'same-origin' || site === 'none') return
    throw new AppError('cross_site')
  }
  const origin = req.get('origin')
  if (origin !== undefined) {
    if (origin === config.publicUrl) return
    throw new AppError('cross_site')
  }
  if (who === 'customer' || who === 'anyone') return
  throw new AppError('cross_site')
}
