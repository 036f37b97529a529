// Starts the app with the two stand-ins beside it and stops all of them together.
import { fork } from 'node:child_process'
import { once } from 'node:events'

/** A child with a name; resolves when it says that it serves, rejects when it ends before that. */
export function startService(name, file, { env, execArgv = [], args = [] }) {
  const child = fork(file, args, { env, execArgv, stdio: ['ignore', 'inherit', 'inherit', 'ipc'] })
  const ready = new Promise((resolve, reject) => {
    child.on('message', message => message?.ready && resolve())
    child.once('exit', code => reject(new Error(`${name} ended before it served (${code})`)))
  })
  return { name, child, ready }
}

/**
 * Stops every service on SIGINT or SIGTERM, however often they come, or when the parent is gone; ends the
 * process within ten seconds whatever happens.
 */
export function stopTogether(services) {
  let stopping = false
  const stop = code => {
    if (stopping) return
    stopping = true
    setTimeout(() => {
      for (const { child } of services) child.kill('SIGKILL')
      process.exit(1)
    }, 9_000).unref()
    const ended = services.map(async ({ child }) => {
      if (child.exitCode !== null || child.signalCode !== null) return
      child.kill('SIGTERM')
      await once(child, 'exit')
    })
    Promise.all(ended).then(() => process.exit(code))
  }
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => stop(0))
  const parent = process.ppid
  setInterval(() => {
    if (process.ppid !== parent) stop(0)
  }, 500).unref()
  for (const { name, child } of services)
    child.once('exit', code => {
      if (!stopping) process.stderr.write(`${name} ended by itself (${code}); stopping the rest.\n`)
      stop(1)
    })
  return stop
}

export async function waitFor(url, { forMs = 60_000 } = {}) {
  const until = Date.now() + forMs
  let last = ''
  while (Date.now() < until) {
    try {
      const response = await fetch(url, { signal: AbortSignal.timeout(3_000) })
      if (response.ok) return
      last = `${response.status} ${await response.text()}`
    } catch (error) {
      last = error.message
    }
    await new Promise(resolve => setTimeout(resolve, 150))
  }
  throw new Error(`${url} did not get ready: ${last}`)
}

/** The environment of a demonstration or development run: what is given is kept, the rest is made up. */
export function madeUpEnvironment(mode) {
  const given = process.env
  const port = given.PORT || '4310'
  const paymentPort = given.PAYMENT_PORT || '4311'
  const smtpPort = given.MAIL_SMTP_PORT || '4313'
  return {
    ...given,
    NODE_ENV: mode === 'development' ? 'development' : 'production',
    TALLYKIN_MODE: given.TALLYKIN_MODE || mode,
    PORT: port,
    PAYMENT_PORT: paymentPort,
    MAIL_HTTP_PORT: given.MAIL_HTTP_PORT || '4312',
    MAIL_SMTP_PORT: smtpPort,
    DATA_DIR: given.DATA_DIR || './data',
    PUBLIC_URL: given.PUBLIC_URL || `http://localhost:${port}`,
    STRIPE_SECRET_KEY: given.STRIPE_SECRET_KEY || 'sk_test_demonstration',
    STRIPE_WEBHOOK_SECRET: given.STRIPE_WEBHOOK_SECRET || 'whsec_demonstration',
    STRIPE_API_BASE: given.STRIPE_API_BASE || `http://localhost:${paymentPort}`,
    SMTP_URL: given.SMTP_URL || `smtp://localhost:${smtpPort}`,
    MAIL_FROM: given.MAIL_FROM || 'orders@tallykin.example',
    AUTH_SECRET: given.AUTH_SECRET || 'demonstration-only-secret-of-no-value',
    LOG_LEVEL: given.LOG_LEVEL || 'warn',
  }
}
