import { type ChildProcess, fork } from 'node:child_process'
import { once } from 'node:events'
import { mkdtempSync, rmSync } from 'node:fs'
import { createServer } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { pathToFileURL } from 'node:url'

const dist = join(import.meta.dirname, '../dist')

/** A whole Tallykin of its own: the production build with the demonstration in it, and the two stand-ins. */
export type Stack = { url: string; payments: string; mail: string; stop: () => Promise<void> }

function freePort(): Promise<number> {
  return new Promise(resolve => {
    const server = createServer()
    server.listen(0, '127.0.0.1', () => {
      const { port } = server.address() as { port: number }
      server.close(() => resolve(port))
    })
  })
}

/** Starts one. `seededAt` and `now` set the clock for seeding and for running; without them it is the machine's. */
export async function startStack(options: { seededAt?: string; now?: string } = {}): Promise<Stack> {
  const [port, paymentPort, mailPort, smtpPort] = await Promise.all([
    freePort(),
    freePort(),
    freePort(),
    freePort(),
  ])
  const dir = mkdtempSync(join(tmpdir(), 'tallykin-e2e-'))
  const env = {
    ...process.env,
    NODE_ENV: 'production',
    TALLYKIN_MODE: 'demo',
    PORT: String(port),
    PAYMENT_PORT: String(paymentPort),
    MAIL_HTTP_PORT: String(mailPort),
    MAIL_SMTP_PORT: String(smtpPort),
    DATA_DIR: dir,
    PUBLIC_URL: `http://localhost:${port}`,
    STRIPE_SECRET_KEY: 'sk_test_end_to_end',
    STRIPE_WEBHOOK_SECRET: 'whsec_end_to_end',
    STRIPE_API_BASE: `http://localhost:${paymentPort}`,
    SMTP_URL: `smtp://localhost:${smtpPort}`,
    MAIL_FROM: 'orders@tallykin.example',
    AUTH_SECRET: 'end-to-end-only-secret-of-no-value',
    LOG_LEVEL: 'error',
  }
  const children: ChildProcess[] = []
  const start = (file: string, now: string | undefined) => {
    const child = fork(join(dist, file), [], {
      env: { ...env, ...(now && { TALLYKIN_NOW: now }) },
      stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
    })
    children.push(child)
  }
  const stack = {
    url: env.PUBLIC_URL,
    payments: env.STRIPE_API_BASE,
    mail: `http://localhost:${mailPort}`,
    async stop() {
      await Promise.all(
        children.map(async child => {
          if (child.exitCode !== null || child.signalCode !== null) return
          child.kill('SIGTERM')
          await once(child, 'exit')
        }),
      )
      rmSync(dir, { recursive: true, force: true })
    },
  }
  start('fakes/payments.js', options.now)
  start('fakes/mail.js', options.now)
  await Promise.all([serves(`${stack.payments}/healthz`), serves(`${stack.mail}/healthz`)])
  const seed = await import(pathToFileURL(join(dist, 'server/demo/seed-demo.js')).href)
  await seed.seedDemo({
    ...env,
    ...((options.seededAt ?? options.now) && { TALLYKIN_NOW: options.seededAt ?? options.now }),
  })
  start('server/main.js', options.now)
  await serves(`${stack.url}/readyz`)
  return stack
}

async function serves(url: string) {
  const until = Date.now() + 30_000
  for (;;) {
    const answers = await fetch(url).then(
      response => response.ok,
      () => false,
    )
    if (answers) return
    if (Date.now() > until) throw new Error(`${url} does not answer`)
    await new Promise(resolve => setTimeout(resolve, 100))
  }
}
