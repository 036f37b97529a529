import type { Plugin } from 'vite'
import { compileCatalog } from '../../shared/messages/compile-catalog.ts'

const CATALOG = /\/(?:locales|messages)\/[\w.-]+\.json\?compiled$/

/** Compiles message catalogs imported with `?compiled`, so that the browser is sent no message compiler. */
export function messageCatalogs(): Plugin {
  return {
    name: 'message-catalogs',
    enforce: 'pre',
    async load(id) {
      if (!CATALOG.test(id)) return null
      const { readFile } = await import('node:fs/promises')
      const file = id.replace(/\?compiled$/, '')
      this.addWatchFile(file)
      const messages = JSON.parse(await readFile(file, 'utf8')) as Record<string, string>
      return { code: `export default ${JSON.stringify(compileCatalog(messages))}`, moduleType: 'js' }
    },
  }
}
