import { type ChildProcess, spawn } from 'node:child_process'
import { mkdtempSync, rmSync } from 'node:fs'
import { createServer } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { eq } from 'drizzle-orm'
import { pino } from 'pino'
import { expect, onTestFinished, test } from 'vitest'
import { startMailFake } from '../fakes/mail/app.ts'
import { startPaymentFake } from '../fakes/payments/app.ts'
import { loadConfig } from './config.ts'
import { migrate } from './db/migrate.ts'
import { openDb } from './db/open.ts'
import { outbox } from './db/schema/mail.ts'
import { order, sellerTally } from './db/schema/orders.ts'
import { makeDeps } from './make-deps.ts'
import { migrationsDir, rootDir } from './paths.ts'
import { anOrder, makeBuilders } from './testing/builders.ts'
import { until } from './testing/until.ts'

const freePort = () =>
  new Promise<number>(resolve => {
    const server = createServer()
    server.listen(0, '127.0.0.1', () => {
      const { port } = server.address() as { port: number }
      server.close(() => resolve(port))
    })
  })

/** A server of its own process on a prepared database, with stand-ins that outlive it. */
async function aServerThatCanDie() {
  const dir = mkdtempSync(join(tmpdir(), 'tallykin-crash-'))
  const port = await freePort()
  const url = `http://127.0.0.1:${port}`
  const payments = await startPaymentFake({
    port: 0,
    dataDir: dir,
    webhookUrl: `${url}/api/webhooks/payments`,
    webhookSecret: 'whsec_for_tests_only',
    secretKey: 'sk_test_for_tests_only',
    now: Date.now,
  })
  const mail = await startMailFake({ httpPort: 0, smtpPort: 0, dataDir: dir })
  const env = {
    TALLYKIN_MODE: 'test',
    PORT: String(port),
    PUBLIC_URL: url,
    DATA_DIR: dir,
    STRIPE_SECRET_KEY: 'sk_test_for_tests_only',
    STRIPE_WEBHOOK_SECRET: 'whsec_for_tests_only',
    STRIPE_API_BASE: payments.url,
    SMTP_URL: `smtp://127.0.0.1:${mail.smtpPort}`,
    AUTH_SECRET: 'a-secret-for-tests-that-is-long-enough',
    LOG_LEVEL: 'error',
  }
  const db = openDb(join(dir, 'tallykin.sqlite'))
  migrate(db, migrationsDir)
  const deps = makeDeps({ config: loadConfig(env), db, log: pino({ level: 'silent' }), now: Date.now })
  const make = makeBuilders(deps)
  let child: ChildProcess | null = null
  const start = async (fault?: string) => {
    child = spawn(process.execPath, ['--import', 'tsx', 'server/testing/serve-api.ts'], {
      cwd: rootDir,
      env: { ...process.env, ...env, ...(fault && { FAULT: fault }) },
      stdio: 'inherit',
    })
    await until(
      async () =>
        fetch(`${url}/healthz`).then(
          r => r.ok,
          () => false,
        ),
      15_000,
    )
  }
  onTestFinished(async () => {
    child?.kill('SIGKILL')
    await Promise.all([payments.close(), mail.close()])
    deps.mailer.close()
    db.raw.close()
    rmSync(dir, { recursive: true, force: true })
  })
  return {
    url,
    db,
    make,
    start,
    died: () => until(() => child?.signalCode === 'SIGKILL', 15_000),
    pay: (id: string) =>
      fetch(`${payments.url}/_test/sessions/${id}/pay`, {
        method: 'POST',
        headers: { 'Content-Type': 'application/json' },
        body: JSON.stringify({ card: '4242424242424242' }),
      }),
    mailbox: async () => (await (await fetch(`${mail.httpUrl}/messages`)).json()) as { to: string }[],
    sessions: async () => (await (await fetch(`${payments.url}/_test/sessions`)).json()) as { id: string }[],
    place: (token: string, key: string) =>
      fetch(`${url}/api/stores/${token}/orders`, {
        method: 'POST',
        headers: { 'Content-Type': 'application/json', 'Idempotency-Key': key },
        body: JSON.stringify(anOrder()),
      }),
  }
}

// Killed between the inbox row and the settled order, inside the settling transaction, and between sending and noting.
test.each(['F10', 'F12', 'F13', 'F16'])(
  'killed at %s while an order is being paid, then started again: paid, credited and mailed once',
  async point => {
    const server = await aServerThatCanDie()
    const store = server.make.store()
    await server.start(`${point}:1:kill`)
    const placed = await (await server.place(store.token, 'key-of-the-order')).json()
    await server.pay(/cs_[A-Za-z0-9_]+/.exec(placed.payUrl)![0])
    await server.died()
    // The lease of a letter that was being sent lasts a minute; the test does not.
    server.db.raw.exec('update outbox set lease_until = 0')

    await server.start()
    await until(() => server.db.orm.select().from(order).get()?.status === 'paid', 30_000)
    await until(async () => (await server.mailbox()).length > 0, 30_000)

    const tally = server.db.orm
      .select()
      .from(sellerTally)
      .where(eq(sellerTally.sellerId, store.seller.id))
      .all()
    expect(tally.map(row => row.quantity)).toEqual([2])
    await until(() =>
      server.db.orm
        .select()
        .from(outbox)
        .all()
        .every(letter => letter.state === 'sent'),
    )
    expect(await server.mailbox()).toMatchObject([{ to: 'ruth@example.com' }])
  },
  90_000,
)

test.each(['F01', 'F02', 'F03', 'F05', 'F06'])(
  'killed at %s while an order is being placed, then asked again with the same key: one order, one payment page',
  async point => {
    const server = await aServerThatCanDie()
    const store = server.make.store()
    await server.start(`${point}:1:kill`)
    await expect(server.place(store.token, 'key-of-the-order')).rejects.toThrow()
    await server.died()

    await server.start()
    const again = await server.place(store.token, 'key-of-the-order')

    expect(again.status).toBe(201)
    expect(server.db.orm.select().from(order).all()).toHaveLength(1)
    expect(await server.sessions()).toHaveLength(1)
  },
  90_000,
)
