import { existsSync } from 'node:fs'
import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'

/** The project's root, from the sources and from the bundle in dist/ alike. */
export const rootDir = findRoot(dirname(fileURLToPath(import.meta.url)))
export const migrationsDir = join(rootDir, 'server/db/migrations')
export const distDir = join(rootDir, 'dist')

function findRoot(from: string): string {
  if (existsSync(join(from, 'package.json'))) return from
  const parent = dirname(from)
  if (parent === from) throw new Error('package.json not found above the server')
  return findRoot(parent)
}
