// Installs what a fresh clone lacks, and only then. Plain Node, no dependencies: it runs before there are any.
import { execFileSync } from 'node:child_process'
import { createHash } from 'node:crypto'
import { existsSync, readFileSync, writeFileSync } from 'node:fs'
import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'

const root = join(dirname(fileURLToPath(import.meta.url)), '../..')

/** Runs `npm ci` when node_modules is missing, or the lock or Node has changed since it was made. */
export function ensureInstalled() {
  const [major, minor] = process.versions.node.split('.').map(Number)
  if (major < 20 || (major === 20 && minor < 20)) {
    process.stderr.write(`Tallykin needs Node.js 20.20 or newer; this is ${process.versions.node}.\n`)
    process.exit(1)
  }
  const stamp = join(root, 'node_modules/.tallykin-installed')
  const wanted = createHash('sha256')
    .update(readFileSync(join(root, 'package-lock.json')))
    .update(process.version)
    .update(process.arch)
    .digest('hex')
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return
  process.stdout.write('Installing what is needed (about a minute and a half) …\n')
  execFileSync('npm', ['ci', '--no-audit', '--no-fund', '--loglevel=error'], {
    cwd: root,
    stdio: ['ignore', 'inherit', 'inherit'],
    env: { ...process.env, ...nodeHeaders() },
  })
  writeFileSync(stamp, wanted)
}

/** Where no prebuilt database driver can be had, it is compiled against the headers Node came with. */
function nodeHeaders() {
  const prefix = dirname(dirname(process.execPath))
  return existsSync(join(prefix, 'include/node/node.h')) ? { npm_config_nodedir: prefix } : {}
}

/** The path of a Chromium for the browser tests. On Debian, as root, it is installed; elsewhere we say how. */
export function ensureChromium() {
  const found = findChromium()
  if (found) return found
  if (existsSync('/etc/debian_version') && process.getuid?.() === 0) {
    process.stdout.write('Installing Chromium for the browser tests …\n')
    const apt = args =>
      execFileSync('apt-get', args, {
        stdio: ['ignore', 'ignore', 'inherit'],
        env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' },
      })
    apt(['update', '-qq'])
    apt(['install', '-y', '-qq', '--no-install-recommends', 'chromium'])
    const installed = findChromium()
    if (installed) return installed
  }
  process.stderr.write('The browser tests need Chromium: install it, or set CHROMIUM_PATH to where it is.\n')
  process.exit(1)
}

function findChromium() {
  const places = [
    process.env.CHROMIUM_PATH,
    '/usr/bin/chromium',
    '/usr/bin/chromium-browser',
    '/usr/bin/google-chrome',
    '/Applications/Google Chrome.app/Contents/MacOS/Google Chrome',
  ]
  return places.find(path => path && existsSync(path))
}
