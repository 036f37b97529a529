// `npm run dev`: the same services from the sources, the client with hot reload on the app's own port.
import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { ensureInstalled } from './bootstrap.mjs'
import { keepCodesShown } from './demo-codes.mjs'
import { madeUpEnvironment, startService, stopTogether, waitFor } from './services.mjs'

const root = join(dirname(fileURLToPath(import.meta.url)), '../..')
process.chdir(root)
ensureInstalled()

const env = madeUpEnvironment('development')
const fromSources = { env, execArgv: ['--import', 'tsx'] }
const services = [
  startService('payment stand-in', join(root, 'fakes/payments/main.ts'), fromSources),
  startService('mail catcher', join(root, 'fakes/mail/main.ts'), fromSources),
]
const stop = stopTogether(services)
try {
  await Promise.all([
    waitFor(`http://localhost:${env.PAYMENT_PORT}/healthz`),
    waitFor(`http://localhost:${env.MAIL_HTTP_PORT}/healthz`),
  ])
  const seed = startService('seed', join(root, 'server/demo/seed-main.ts'), fromSources)
  await seed.ready
  // tsx watches what the server imports and starts it anew when that changes.
  const app = startService('Tallykin', join(root, 'node_modules/tsx/dist/cli.mjs'), {
    env,
    args: ['watch', 'server/main.ts'],
  })
  services.push(app)
  app.child.once('exit', () => stop(1))
  await waitFor(`http://localhost:${env.PORT}/readyz`)
  const { describeDemo, demoCodes } = await import('tsx/esm/api').then(tsx =>
    tsx.tsImport('../demo/seed-demo.ts', import.meta.url),
  )
  keepCodesShown(env, demoCodes)
  process.stdout.write(describeDemo(env))
} catch (error) {
  process.stderr.write(`${error.message}\n`)
  stop(1)
}
