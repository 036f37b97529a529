import { readFileSync } from 'node:fs'
import type { Server } from 'node:http'
import { join } from 'node:path'
import { pathToFileURL } from 'node:url'
import type { Config } from '../config.ts'
import { distDir, rootDir } from '../paths.ts'
import type { PageBuild, PageData } from './pages.ts'

/** What the client's server entry gives: one function that renders, one that puts the document around it. */
type Renderer = {
  render: (request: {
    url: string
    locale: 'en' | 'es'
    data: PageData
    now: number
    nonce: string
  }) => Promise<{
    status: number
    html: string
    head: unknown
    dehydrated: unknown
  }>
  document: (parts: {
    html: string
    head: unknown
    css: string
    styles: string[]
    scripts: string[]
    preloads: string[]
    nonce: string
    state: unknown
    locale: 'en' | 'es'
    publicUrl: string
  }) => string
}

type LoadedPages = { build: PageBuild; attach?: (server: Server) => void; close?: () => Promise<void> }

type Manifest = Record<string, { file: string; css?: string[]; imports?: string[]; assets?: string[] }>

/** The built client in every mode but development, where Vite serves it with hot reload on the same port. */
export async function loadPages(config: Config): Promise<LoadedPages> {
  return config.mode === 'development' ? loadDevPages() : loadBuiltPages()
}

async function loadBuiltPages(): Promise<LoadedPages> {
  const webDir = join(distDir, 'web')
  const manifest = JSON.parse(readFileSync(join(webDir, '.vite/manifest.json'), 'utf8')) as Manifest
  const renderer = (await import(pathToFileURL(join(distDir, 'web-ssr/entry-server.js')).href)) as Renderer
  const store = entryFiles(manifest, 'web/main-store.tsx')
  const desk = entryFiles(manifest, 'web/main-desk.tsx')
  const preloads = fontsFirstSeen(manifest)
  const css = store.css.map(file => readFileSync(join(webDir, file), 'utf8')).join('\n')
  return {
    build: {
      assetsDir: join(webDir, 'assets'),
      async renderPage(request) {
        const page = await renderer.render(request)
        return {
          status: page.status,
          html: renderer.document({
            html: page.html,
            head: page.head,
            css,
            styles: [],
            scripts: store.scripts,
            preloads,
            nonce: request.nonce,
            state: page.dehydrated,
            locale: request.locale,
            publicUrl: request.publicUrl,
          }),
        }
      },
      async deskPage({ nonce }) {
        return renderer.document({
          html: '',
          head: { title: 'Tallykin' },
          css: '',
          styles: desk.css.map(file => `/${file}`),
          scripts: desk.scripts,
          preloads,
          nonce,
          state: null,
          locale: 'en',
          publicUrl: '',
        })
      },
    },
  }
}

/** An entry's script and those it needs at once, and all of their styles. */
function entryFiles(manifest: Manifest, entry: string) {
  const found = manifest[entry]
  if (!found) throw new Error(`The client build has no ${entry}; run the build first`)
  const seen = new Set<string>()
  const css = new Set<string>()
  const walk = (name: string) => {
    const chunk = manifest[name]
    if (!chunk || seen.has(name)) return
    seen.add(name)
    for (const file of chunk.css ?? []) css.add(file)
    for (const next of chunk.imports ?? []) walk(next)
  }
  walk(entry)
  return { scripts: [`/${found.file}`], css: [...css] }
}

/** The two faces that the first screenful is set in. */
function fontsFirstSeen(manifest: Manifest): string[] {
  const files = Object.values(manifest).flatMap(chunk => [chunk.file, ...(chunk.assets ?? [])])
  return [/besley-latin-wght/, /atkinson-hyperlegible-next-latin-wght/].flatMap(face => {
    const file = files.find(name => face.test(name) && !/latin-ext/.test(name))
    return file ? [`/${file}`] : []
  })
}

async function loadDevPages(): Promise<LoadedPages> {
  const { createServer } = await import('vite')
  const { createServer: createHttpServer } = await import('node:http')
  // The socket of hot reload is attached to our own server once that listens.
  const hmrServer = createHttpServer()
  const vite = await createServer({
    configFile: join(rootDir, 'vite.config.ts'),
    root: rootDir,
    appType: 'custom',
    server: { middlewareMode: true, hmr: { server: hmrServer } },
  })
  const load = () => vite.ssrLoadModule('/web/entry-server.tsx') as Promise<Renderer>
  return {
    build: {
      assetsDir: null,
      middleware: vite.middlewares,
      async renderPage(request) {
        const renderer = await load()
        const page = await renderer.render(request)
        const html = renderer.document({
          html: page.html,
          head: page.head,
          css: '',
          styles: ['/web/styles/app.css'],
          scripts: ['/@vite/client', '/web/main-store.tsx'],
          preloads: [],
          nonce: request.nonce,
          state: page.dehydrated,
          locale: request.locale,
          publicUrl: request.publicUrl,
        })
        return {
          status: page.status,
          html: withNonce(await vite.transformIndexHtml(request.url, html), request.nonce),
        }
      },
      async deskPage({ nonce, url }) {
        const renderer = await load()
        const html = renderer.document({
          html: '',
          head: { title: 'Tallykin' },
          css: '',
          styles: ['/web/styles/app.css'],
          scripts: ['/@vite/client', '/web/main-desk.tsx'],
          preloads: [],
          nonce,
          state: null,
          locale: 'en',
          publicUrl: '',
        })
        return withNonce(await vite.transformIndexHtml(url, html), nonce)
      },
    },
    attach: server => server.on('upgrade', (...upgrade) => hmrServer.emit('upgrade', ...upgrade)),
    close: () => vite.close(),
  }
}

/** Scripts that the development server adds carry no nonce of their own. */
function withNonce(html: string, nonce: string): string {
  return html.replace(/<script(?![^>]*\bnonce=)/g, `<script nonce="${nonce}"`)
}
