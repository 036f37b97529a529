// The production build: client, its server renderer, server and fakes, pictures; assets compressed beforehand.
import { createHash } from 'node:crypto'
import { mkdirSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs'
import { dirname, join, relative } from 'node:path'
import { fileURLToPath } from 'node:url'
import { brotliCompressSync, constants, gzipSync } from 'node:zlib'
import { ensureInstalled } from './bootstrap.mjs'

const root = join(dirname(fileURLToPath(import.meta.url)), '../..')
const dist = join(root, 'dist')
const SOURCES = [
  'server',
  'web',
  'shared',
  'emails',
  'fakes',
  'package-lock.json',
  'vite.config.ts',
  'tsconfig.json',
]

/** Builds everything, unless the last build was made from these very sources. */
export async function build({ force = false } = {}) {
  const mark = sourcesHash()
  const stamp = join(dist, '.built-from')
  try {
    if (!force && readFileSync(stamp, 'utf8') === mark) return
  } catch {
    // No build yet.
  }
  rmSync(dist, { recursive: true, force: true })
  mkdirSync(dist, { recursive: true })
  await buildWeb()
  await buildNode()
  await buildPictures()
  compress(join(dist, 'web/assets'))
  writeFileSync(stamp, mark)
}

async function buildWeb() {
  const vite = await import('vite')
  const common = { root, configFile: join(root, 'vite.config.ts'), logLevel: 'warn' }
  await vite.build(common)
  await vite.build({
    ...common,
    build: { ssr: 'web/entry-server.tsx', outDir: join(dist, 'web-ssr'), emptyOutDir: true, manifest: false },
  })
}

async function buildNode() {
  const esbuild = await import('esbuild')
  await esbuild.build({
    entryPoints: {
      'server/main': 'server/main.ts',
      'server/demo/seed-demo': 'server/demo/seed-demo.ts',
      'fakes/payments': 'fakes/payments/main.ts',
      'fakes/mail': 'fakes/mail/main.ts',
    },
    absWorkingDir: root,
    bundle: true,
    splitting: true,
    packages: 'external',
    platform: 'node',
    format: 'esm',
    target: 'node20',
    jsx: 'automatic',
    sourcemap: true,
    outdir: dist,
    chunkNames: 'server/chunks/[name]-[hash]',
    logLevel: 'warning',
  })
}

/** The demonstration's illustrations as the pictures that an upload would become. */
async function buildPictures() {
  const { default: sharp } = await import('sharp')
  const from = join(root, 'server/demo/pictures')
  const to = join(dist, 'pictures')
  mkdirSync(to, { recursive: true })
  for (const file of readdirSync(from).filter(name => name.endsWith('.svg'))) {
    const svg = readFileSync(join(from, file))
    for (const width of [480, 960])
      writeFileSync(
        join(to, `${file.replace('.svg', '')}-${width}.webp`),
        await sharp(svg, { density: 72 * (width / 480) })
          .resize(width)
          .webp({ lossless: true, effort: 6 })
          .toBuffer(),
      )
  }
}

function compress(dir) {
  for (const name of readdirSync(dir)) {
    if (!/\.(js|css|svg|json)$/.test(name)) continue
    const plain = readFileSync(join(dir, name))
    writeFileSync(
      join(dir, `${name}.br`),
      brotliCompressSync(plain, { params: { [constants.BROTLI_PARAM_QUALITY]: 11 } }),
    )
    writeFileSync(join(dir, `${name}.gz`), gzipSync(plain, { level: 9 }))
  }
}

function sourcesHash() {
  const hash = createHash('sha256')
  const walk = path => {
    if (statSync(path).isDirectory()) {
      for (const name of readdirSync(path).sort()) walk(join(path, name))
      return
    }
    if (/\.(test|spec)\.tsx?$/.test(path)) return
    hash.update(relative(root, path)).update(readFileSync(path))
  }
  for (const source of SOURCES) walk(join(root, source))
  return hash.digest('hex')
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  ensureInstalled()
  await build({ force: true })
}
