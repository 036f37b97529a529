// `npm run demo`: the production build with invented data, the payment stand-in and the mail catcher.
import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { ensureInstalled } from './bootstrap.mjs'
import { build } from './build.mjs'
import { keepCodesShown } from './demo-codes.mjs'
import { madeUpEnvironment, startService, stopTogether, waitFor } from './services.mjs'

const root = join(dirname(fileURLToPath(import.meta.url)), '../..')
process.chdir(root)
ensureInstalled()
await build()

const env = madeUpEnvironment('demo')
const services = [
  startService('payment stand-in', join(root, 'dist/fakes/payments.js'), { env }),
  startService('mail catcher', join(root, 'dist/fakes/mail.js'), { env }),
]
const stop = stopTogether(services)
try {
  await Promise.all([
    waitFor(`http://localhost:${env.PAYMENT_PORT}/healthz`),
    waitFor(`http://localhost:${env.MAIL_HTTP_PORT}/healthz`),
  ])
  const { seedDemo, describeDemo, demoCodes } = await import(join(root, 'dist/server/demo/seed-demo.js'))
  await seedDemo(env)
  const app = startService('Tallykin', join(root, 'dist/server/main.js'), { env })
  services.push(app)
  app.child.once('exit', () => stop(1))
  await waitFor(`http://localhost:${env.PORT}/readyz`)
  keepCodesShown(env, demoCodes)
  process.stdout.write(describeDemo(env))
} catch (error) {
  process.stderr.write(`${error.message}\n`)
  stop(1)
}
