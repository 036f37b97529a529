import { randomBytes } from 'node:crypto'
import type { RequestHandler, Response } from 'express'
import helmet from 'helmet'
import type { Config } from '../config.ts'

/** Headers every answer carries. A page adds its own content policy, everything else may load nothing at all. */
export function securityHeaders(config: Config): RequestHandler {
  const isHttps = config.publicUrl.startsWith('https://')
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: { 'default-src': ["'none'"], 'frame-ancestors': ["'none'"], 'base-uri': ["'none'"] },
    },
    // `no-referrer` would make our own form posts carry `Origin: null`; a store link still leaks to nobody.
    referrerPolicy: { policy: 'same-origin' },
    strictTransportSecurity: isHttps ? { maxAge: 31_536_000, includeSubDomains: false } : false,
    xFrameOptions: { action: 'deny' },
    crossOriginOpenerPolicy: { policy: 'same-origin' },
  })
}

/** The content policy of a page and the nonce its own scripts and styles carry. */
export function pagePolicy(res: Response, config: Config): string {
  const nonce = randomBytes(16).toString('base64')
  const pay = config.stripe.apiBase ? new URL(config.stripe.apiBase).origin : 'https://checkout.stripe.com'
  res.setHeader(
    'Content-Security-Policy',
    [
      "default-src 'none'",
      `script-src 'self' 'nonce-${nonce}'`,
      // Vite puts styles into the page while developing.
      config.mode === 'development'
        ? "style-src 'self' 'unsafe-inline'"
        : `style-src 'self' 'nonce-${nonce}'`,
      "img-src 'self' data: blob:",
      "font-src 'self'",
      `connect-src 'self'${config.mode === 'development' ? ' ws:' : ''}`,
      "manifest-src 'self'",
      `form-action 'self' ${pay}`,
      "frame-ancestors 'none'",
      "base-uri 'none'",
      "object-src 'none'",
      ...(config.publicUrl.startsWith('https://') ? ['upgrade-insecure-requests'] : []),
    ].join('; '),
  )
  return nonce
}
