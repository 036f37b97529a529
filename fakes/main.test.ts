import { type ChildProcess, fork } from 'node:child_process'
import { once } from 'node:events'
import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { expect, onTestFinished, test } from 'vitest'
import { listen } from './listen.ts'

const STANDS = [
  { file: 'payments/main.ts', port: 'PAYMENT_PORT', health: 'PAYMENT_PORT' },
  { file: 'mail/main.ts', port: 'MAIL_HTTP_PORT', health: 'MAIL_HTTP_PORT' },
] as const

async function start(file: string, env: Record<string, string>) {
  const dataDir = mkdtempSync(join(tmpdir(), 'stand-in-'))
  const child = fork(join(import.meta.dirname, file), [], {
    execArgv: ['--import', 'tsx'],
    env: { PATH: process.env.PATH, DATA_DIR: dataDir, STRIPE_WEBHOOK_SECRET: 'whsec_of_the_tests', ...env },
    stdio: ['ignore', 'pipe', 'pipe', 'ipc'],
  })
  onTestFinished(() => {
    child.kill('SIGKILL')
    rmSync(dataDir, { recursive: true, force: true })
  })
  return child
}

async function ended(child: ChildProcess): Promise<{ code: number | null; took: number }> {
  const begun = performance.now()
  const [code] = await once(child, 'exit')
  return { code, took: performance.now() - begun }
}

async function freePort(): Promise<number> {
  const { server, port } = await listen(() => undefined, 0)
  await new Promise(resolve => server.close(resolve))
  return port
}

async function portsFor(): Promise<Record<string, string>> {
  return {
    PAYMENT_PORT: String(await freePort()),
    MAIL_HTTP_PORT: String(await freePort()),
    MAIL_SMTP_PORT: String(await freePort()),
  }
}

test.each(STANDS)(
  '$file says when it serves and stops on SIGTERM within two seconds',
  async ({ file, health }) => {
    const env = await portsFor()
    const child = await start(file, env)

    const [message] = await once(child, 'message')
    const answer = await fetch(`http://localhost:${env[health]}/healthz`)
    child.kill('SIGTERM')
    child.kill('SIGTERM')
    const end = await ended(child)

    expect(message).toEqual({ ready: true })
    expect(answer.status).toBe(200)
    expect(end.code).toBe(0)
    expect(end.took).toBeLessThan(2_000)
  },
)

test.each(STANDS)('$file stops when its parent is gone', async ({ file }) => {
  const child = await start(file, await portsFor())
  await once(child, 'message')

  child.disconnect()

  expect((await ended(child)).code).toBe(0)
})

test.each(STANDS)('$file ends with one line when its port is taken', async ({ file, port }) => {
  const { server, port: taken } = await listen(() => undefined, 0)
  onTestFinished(() => void server.close())
  const child = await start(file, { ...(await portsFor()), [port]: String(taken) })
  let said = ''
  child.stderr?.on('data', piece => {
    said += piece
  })

  const end = await ended(child)

  expect(end.code).toBe(1)
  expect(said).toMatch(/^listen EADDRINUSE[^\n]*\n$/)
})

test('a bad port or instant stops it with a line that names the variable', async () => {
  for (const [name, value] of [
    ['PAYMENT_PORT', 'abc'],
    ['TALLYKIN_NOW', 'yesterday'],
    ['STRIPE_WEBHOOK_SECRET', ''],
  ] as const) {
    const child = await start('payments/main.ts', { ...(await portsFor()), [name]: value })
    let said = ''
    child.stderr?.on('data', piece => {
      said += piece
    })
    expect((await ended(child)).code).toBe(1)
    expect(said).toContain(name)
  }
})
