// `npm run bench`: every performance figure beside its bare equivalent, measured in one run.
import { spawn } from 'node:child_process'
import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { ensureInstalled } from './bootstrap.mjs'
import { build } from './build.mjs'

const root = join(dirname(fileURLToPath(import.meta.url)), '../..')
process.chdir(root)
ensureInstalled()
await build()
const child = spawn(process.execPath, ['--import', 'tsx', 'e2e/bench/main.ts', ...process.argv.slice(2)], {
  stdio: 'inherit',
})
child.on('exit', code => process.exit(code ?? 1))
