import { existsSync, readdirSync, readFileSync } from 'node:fs'
import { extname, join } from 'node:path'
import type express from 'express'
import type { Express } from 'express'
import { AppError } from '#shared/errors.ts'
import type { Deps } from '../deps.ts'
import type { PageBuild } from './pages.ts'

const types: Record<string, string> = {
  '.js': 'text/javascript; charset=utf-8',
  '.css': 'text/css; charset=utf-8',
  '.woff2': 'font/woff2',
  '.svg': 'image/svg+xml',
  '.png': 'image/png',
  '.webp': 'image/webp',
  '.avif': 'image/avif',
}
const IMMUTABLE = 'public, max-age=31536000, immutable'

/** Serves hashed assets from memory, compressed at build time, and pictures from their folder by content hash. */
export function mountStatic(app: Express, deps: Deps, pages: PageBuild) {
  if (pages.assetsDir) mountAssets(app, pages.assetsDir)
  if (pages.middleware) app.use(pages.middleware)
  app.get('/pictures/:file', (req, res, next) => {
    const file = String(req.params.file)
    if (!/^[0-9a-f]{64}-(480|960)\.webp$/.test(file)) throw new AppError('not_found')
    res.sendFile(
      file,
      {
        root: join(deps.config.dataDir, 'pictures'),
        headers: {
          'Cache-Control': IMMUTABLE,
          'Content-Type': 'image/webp',
          'Content-Disposition': 'inline',
        },
        cacheControl: false,
        dotfiles: 'deny',
      },
      error => {
        if (error) next(new AppError('not_found'))
      },
    )
  })
  app.get('/robots.txt', (_req, res) => {
    // Pages say themselves that they are not to be indexed; a crawler must be able to read that.
    res.type('text/plain').send('User-agent: *\nAllow: /\n')
  })
  app.get('/favicon.ico', (_req, res) => void res.status(204).end())
}

function mountAssets(app: Express, dir: string) {
  type Asset = { plain: Buffer; br: Buffer | null; gz: Buffer | null; type: string }
  const assets = new Map<string, Asset>()
  for (const name of existsSync(dir) ? readdirSync(dir) : []) {
    const type = types[extname(name)]
    if (!type) continue
    const read = (ending: string) =>
      existsSync(join(dir, name + ending)) ? readFileSync(join(dir, name + ending)) : null
    assets.set(name, { plain: readFileSync(join(dir, name)), br: read('.br'), gz: read('.gz'), type })
  }
  app.get('/assets/:name', (req: express.Request, res: express.Response) => {
    const asset = assets.get(String(req.params.name))
    if (!asset) throw new AppError('not_found')
    const accepted = String(req.headers['accept-encoding'] ?? '')
    const encoding =
      asset.br && /\bbr\b/.test(accepted) ? 'br' : asset.gz && /\bgzip\b/.test(accepted) ? 'gzip' : null
    res.setHeader('Content-Type', asset.type)
    res.setHeader('Cache-Control', IMMUTABLE)
    res.setHeader('Vary', 'Accept-Encoding')
    if (encoding) res.setHeader('Content-Encoding', encoding)
    const body = encoding === 'br' ? asset.br! : encoding === 'gzip' ? asset.gz! : asset.plain
    res.setHeader('Content-Length', body.length)
    res.end(body)
  })
}
