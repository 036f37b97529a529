import type { Express, Request, RequestHandler, Response } from 'express'
import type { ReceiptView } from '#shared/orders/contract.ts'
import type { StoreView } from '#shared/stores/contract.ts'
import { type Locale, publicId } from '#shared/wire.ts'
import type { Deps } from '../deps.ts'
import { findReceipt } from '../orders/receipt-view.ts'
import { findStoreView } from '../stores/store-view.ts'
import { pagePolicy } from './security.ts'

/** What a server-rendered page is made from. */
export type PageData =
  | { store: { token: string; view: StoreView } }
  | { receipt: { id: string; view: ReceiptView } }
  | { notFound: true }

/** The web build's own renderer, loaded at run time: the server never reads the client's sources. */
export type PageBuild = {
  /** Folder of hashed assets, or null where a development server hands them out. */
  assetsDir: string | null
  /** The development server's own handler. */
  middleware?: RequestHandler
  renderPage: (request: {
    url: string
    locale: Locale
    data: PageData
    now: number
    nonce: string
    publicUrl: string
  }) => Promise<{ status: number; html: string }>
  deskPage: (request: { nonce: string; url: string }) => Promise<string>
}

/** Addresses of the desks; all get the same page, which then draws itself. */
const DESKS = [
  '/',
  '/sign-in',
  '/sign-in/{*rest}',
  '/forgot-password',
  '/reset-password',
  '/account/{*rest}',
  '/account/{*rest}',
  '/invitation',
  '/family',
  '/family/{*rest}',
  '/organizer',
  '/organizer/{*rest}',
  '/operator',
  '/operator/{*rest}',
]

export function mountPages(app: Express, deps: Deps, pages: PageBuild, misses: RequestHandler) {
  /** A link that leads nowhere counts against the address that asked for it. */
  const countMiss = (req: Request, res: Response) =>
    new Promise<void>((resolve, reject) => {
      misses(req, res, error => (error ? reject(error) : resolve()))
    })

  app.get('/s/:token', async (req, res) => {
    const token = publicId.safeParse(req.params.token)
    const view = token.success
      ? findStoreView(deps.db, { token: token.data, locale: 'en', now: deps.now() })
      : null
    if (!view) await countMiss(req, res)
    await sendPage(req, res, view ? { store: { token: token.data!, view } } : { notFound: true })
  })
  app.get('/r/:receipt', async (req, res) => {
    const id = publicId.safeParse(req.params.receipt)
    const view = id.success
      ? findReceipt(deps.db, { receipt: id.data, publicUrl: deps.config.publicUrl })
      : null
    if (!view) await countMiss(req, res)
    await sendPage(req, res, view ? { receipt: { id: id.data!, view } } : { notFound: true })
  })
  app.get(DESKS, async (req, res) => {
    const nonce = pagePolicy(res, deps.config)
    pageHeaders(res, 200)
    res.end(await pages.deskPage({ nonce, url: req.originalUrl }))
  })
  app.get('/{*rest}', async (req, res, next) => {
    if (!req.accepts('html')) return next()
    await sendPage(req, res, { notFound: true })
  })

  async function sendPage(req: Request, res: Response, data: PageData) {
    const nonce = pagePolicy(res, deps.config)
    const page = await pages.renderPage({
      url: req.originalUrl,
      locale: 'en',
      data,
      now: deps.now(),
      nonce,
      publicUrl: deps.config.publicUrl,
    })
    pageHeaders(res, page.status)
    res.end(page.html)
  }
}

function pageHeaders(res: Response, status: number) {
  res.status(status)
  res.setHeader('Content-Type', 'text/html; charset=utf-8')
  res.setHeader('Cache-Control', 'private, no-store')
  res.setHeader('X-Robots-Tag', 'noindex, nofollow')
}
