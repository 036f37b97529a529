import { copyFileSync, existsSync, mkdirSync, mkdtempSync, rmSync } from 'node:fs'
import type { AddressInfo } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { pino } from 'pino'
import { onTestFinished } from 'vitest'
import { createApp } from '../app.ts'
import type { Config } from '../config.ts'
import { migrate } from '../db/migrate.ts'
import { openDb } from '../db/open.ts'
import type { Deps } from '../deps.ts'
import type { PageBuild } from '../http/pages.ts'
import { makeMailWorker } from '../mail/worker.ts'
import { makeDeps } from '../make-deps.ts'
import { migrationsDir } from '../paths.ts'
import { makeReconciler } from '../payments/reconcile.ts'
import { makeBuilders } from './builders.ts'
import { makeFakes } from './fakes.ts'

export const WEBHOOK_SECRET = 'whsec_for_tests_only'
export const SECRET_KEY = 'sk_test_for_tests_only'

/** A clock that a test moves by hand. */
export function handClock(startsAt = Date.UTC(2026, 10, 16, 15, 0)) {
  let at = startsAt
  return {
    now: () => at,
    set: (instant: number | string) => {
      at = typeof instant === 'number' ? instant : Date.parse(instant)
    },
    forward: (ms: number) => {
      at += ms
    },
  }
}

/** A fresh database file, migrated once for the whole run and copied for each test. */
export function freshDatabase(): { dir: string; file: string } {
  const dir = mkdtempSync(join(tmpdir(), 'tallykin-test-'))
  const file = join(dir, 'tallykin.sqlite')
  const template = join(tmpdir(), `tallykin-template-${process.pid}.sqlite`)
  if (!existsSync(template)) {
    const db = openDb(template)
    migrate(db, migrationsDir)
    db.raw.pragma('wal_checkpoint(TRUNCATE)')
    db.raw.close()
    process.once('exit', () => rmSync(template, { force: true }))
  }
  copyFileSync(template, file)
  return { dir, file }
}

/**
 * The whole server on a real port with a real database file, and, unless told otherwise, the real payment
 * and mail stand-ins beside it. Closes itself when the test ends.
 */
export async function startApp(options: { fakes?: boolean; pages?: PageBuild | null; now?: number } = {}) {
  const clock = handClock(options.now)
  const { dir, file } = freshDatabase()
  const db = openDb(file)
  const fakes = options.fakes === false ? null : await makeFakes({ dir, now: clock.now })
  const config: Config = {
    mode: 'test',
    port: 0,
    publicUrl: 'http://localhost:1',
    dataDir: dir,
    startsAt: null,
    stripe: {
      secretKey: SECRET_KEY,
      webhookSecret: WEBHOOK_SECRET,
      apiBase: fakes?.payments.url ?? 'http://127.0.0.1:9',
    },
    mail: { smtpUrl: `smtp://127.0.0.1:${fakes?.mail.smtpPort ?? 9}`, from: 'orders@tallykin.example' },
    authSecret: 'a-secret-for-tests-that-is-long-enough',
    trustProxyHops: 0,
    ordersPerLinkPerMinute: 1200,
    logLevel: 'silent',
    fault: null,
  }
  mkdirSync(join(dir, 'pictures'), { recursive: true })
  const logged: string[] = []
  const log = pino({ level: 'info', base: null }, { write: (line: string) => void logged.push(line) })

  // The port is known only once something listens, and the app wants its own address from the start.
  const { createServer } = await import('node:http')
  const server = createServer()
  await new Promise<void>(resolve => server.listen(0, '127.0.0.1', resolve))
  const url = `http://127.0.0.1:${(server.address() as AddressInfo).port}`
  config.publicUrl = url
  fakes?.announceTo(url)
  const deps: Deps = makeDeps({ config, db, log, now: clock.now })
  server.on('request', createApp(deps, options.pages ?? null))

  const mailWorker = makeMailWorker(deps)
  const reconciler = makeReconciler(deps)
  let closed = false
  const close = async () => {
    if (closed) return
    closed = true
    server.closeAllConnections()
    await new Promise(resolve => server.close(resolve))
    await mailWorker.stop()
    await fakes?.close()
    deps.mailer.close()
    db.raw.close()
    rmSync(dir, { recursive: true, force: true })
  }
  onTestFinished(close)

  return {
    url,
    deps,
    clock,
    dir,
    logged,
    api: makeApi(url),
    fakes: fakes!,
    make: makeBuilders(deps),
    /** Sends all mail that is due. */
    sendMail: () => mailWorker.round(),
    /** One round of asking the payment service about waiting orders. */
    reconcile: () => reconciler.round({ all: true }),
    close,
  }
}

export type TestApp = Awaited<ReturnType<typeof startApp>>

export type Answer = { status: number; body: any; headers: Headers }

/** Requests as a browser page of ours makes them, with an optional cookie. */
export function makeApi(url: string, cookie?: string) {
  const request = async (
    method: string,
    path: string,
    body?: unknown,
    headers: Record<string, string> = {},
  ) => {
    const response = await fetch(url + path, {
      method,
      redirect: 'manual',
      headers: {
        ...(body !== undefined && { 'Content-Type': 'application/json' }),
        ...(method !== 'GET' && { Origin: url, 'Sec-Fetch-Site': 'same-origin' }),
        ...(cookie && { Cookie: cookie }),
        ...headers,
      },
      ...(body !== undefined && { body: typeof body === 'string' ? body : JSON.stringify(body) }),
    })
    const text = await response.text()
    const isJson = /json/.test(response.headers.get('content-type') ?? '')
    return {
      status: response.status,
      body: isJson && text ? JSON.parse(text) : text,
      headers: response.headers,
    } as Answer
  }
  return {
    get: (path: string, headers?: Record<string, string>) => request('GET', path, undefined, headers),
    post: (path: string, body?: unknown, headers?: Record<string, string>) =>
      request('POST', path, body ?? {}, headers),
    request,
    withCookie: (value: string) => makeApi(url, value),
  }
}
