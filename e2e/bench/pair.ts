import { type ChildProcess, fork } from 'node:child_process'
import { once } from 'node:events'
import { cpSync, mkdtempSync, rmSync } from 'node:fs'
import { createServer } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { pathToFileURL } from 'node:url'

const root = join(import.meta.dirname, '../..')

/** Ours and the bare equivalent, each its own process on its own copy of the same seeded database. */
export type Pair = { ours: string; bare: string; stop: () => Promise<void> }

const freePort = () =>
  new Promise<number>(resolve => {
    const server = createServer()
    server.listen(0, '127.0.0.1', () => {
      const { port } = server.address() as { port: number }
      server.close(() => resolve(port))
    })
  })

export async function startPair(): Promise<Pair> {
  const [oursPort, barePort, paymentPort] = await Promise.all([freePort(), freePort(), freePort()])
  const dir = mkdtempSync(join(tmpdir(), 'tallykin-bench-'))
  const [oursDir, bareDir] = [join(dir, 'ours'), join(dir, 'bare')]
  const env = {
    ...process.env,
    NODE_ENV: 'production',
    TALLYKIN_MODE: 'test',
    PORT: String(oursPort),
    PAYMENT_PORT: String(paymentPort),
    DATA_DIR: oursDir,
    PUBLIC_URL: `http://127.0.0.1:${oursPort}`,
    STRIPE_SECRET_KEY: 'sk_test_bench_only',
    STRIPE_WEBHOOK_SECRET: 'whsec_bench_only',
    STRIPE_API_BASE: `http://127.0.0.1:${paymentPort}`,
    SMTP_URL: 'smtp://127.0.0.1:9',
    AUTH_SECRET: 'bench-only-secret-of-no-value-at-all',
    LOG_LEVEL: 'warn',
    ORDERS_PER_LINK_PER_MINUTE: '1000000',
  }
  const children: ChildProcess[] = []
  const start = async (file: string, changes: Record<string, string>, execArgv: string[] = []) => {
    const child = fork(join(root, file), [], {
      env: { ...env, ...changes },
      execArgv,
      stdio: ['ignore', 'ignore', 'inherit', 'ipc'],
    })
    children.push(child)
    await new Promise<void>((resolve, reject) => {
      child.on('message', message => (message as { ready?: boolean }).ready && resolve())
      child.once('exit', code => reject(new Error(`${file} ended (${code})`)))
    })
  }
  await start('dist/fakes/payments.js', { DATA_DIR: dir })
  const seed = await import(pathToFileURL(join(root, 'dist/server/demo/seed-demo.js')).href)
  await seed.seedDemo(env)
  cpSync(oursDir, bareDir, { recursive: true })
  await start('dist/server/main.js', {})
  await start('e2e/bench/bare-server.ts', { PORT: String(barePort), DATA_DIR: bareDir }, ['--import', 'tsx'])
  return {
    ours: `http://127.0.0.1:${oursPort}`,
    bare: `http://127.0.0.1:${barePort}`,
    async stop() {
      await Promise.all(
        children.map(async child => {
          if (child.exitCode !== null) return
          child.kill('SIGKILL')
          await once(child, 'exit')
        }),
      )
      rmSync(dir, { recursive: true, force: true })
    },
  }
}

/** Runs both in turn, so many rounds, after a warm-up of each. */
export async function interleave(rounds: number, run: (url: string) => Promise<number>, pair: Pair) {
  await run(pair.ours)
  await run(pair.bare)
  const ours: number[] = []
  const bare: number[] = []
  for (let n = 0; n < rounds; n++) {
    ours.push(await run(pair.ours))
    bare.push(await run(pair.bare))
  }
  return { ours, bare }
}
