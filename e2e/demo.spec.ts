import { spawn } from 'node:child_process'
import { existsSync, mkdtempSync, rmSync, statSync } from 'node:fs'
import { connect, createServer } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { expect, test } from 'playwright/test'

const freePort = () =>
  new Promise<number>(resolve => {
    const server = createServer()
    server.listen(0, '127.0.0.1', () => {
      const { port } = server.address() as { port: number }
      server.close(() => resolve(port))
    })
  })

const isTaken = (port: number) =>
  new Promise<boolean>(resolve => {
    const socket = connect(port, '127.0.0.1')
    socket.on('connect', () => {
      socket.destroy()
      resolve(true)
    })
    socket.on('error', () => resolve(false))
  })

for (const signal of ['SIGTERM', 'SIGINT'] as const)
  test(`npm run demo starts everything, and ${signal}, also twice, stops all of it; the data stay`, async () => {
    test.setTimeout(180_000)
    const dir = mkdtempSync(join(tmpdir(), 'tallykin-demo-'))
    const ports = await Promise.all([freePort(), freePort(), freePort(), freePort()])
    const [PORT, PAYMENT_PORT, MAIL_HTTP_PORT, MAIL_SMTP_PORT] = ports.map(String)
    const run = async () => {
      const demo = spawn('npm', ['run', 'demo'], {
        cwd: join(import.meta.dirname, '..'),
        env: { ...process.env, PORT, PAYMENT_PORT, MAIL_HTTP_PORT, MAIL_SMTP_PORT, DATA_DIR: dir },
        stdio: ['ignore', 'pipe', 'inherit'],
      })
      let said = ''
      demo.stdout.on('data', part => {
        said += part
      })
      await expect.poll(() => said, { timeout: 60_000 }).toContain('Ctrl-C stops everything')
      const seller = (
        await (await fetch(`http://localhost:${PORT}/api/stores/${/\/s\/(\S+)/.exec(said)![1]}`)).json()
      ).seller
      const begun = Date.now()
      demo.kill(signal)
      demo.kill(signal)
      await expect
        .poll(async () => (await Promise.all(ports.map(isTaken))).some(Boolean), { timeout: 10_000 })
        .toBe(false)
      expect(Date.now() - begun).toBeLessThan(10_000)
      return { said, seller }
    }

    const first = await run()
    expect(first.said).toContain('n.abara@saltmarsh.example.org')
    expect(first.seller).toEqual({ displayName: 'Maya L.' })
    const seeded = statSync(join(dir, '.payments-booked')).mtimeMs
    // Everything is folded into the one file when it stops.
    expect(existsSync(join(dir, 'tallykin.sqlite-wal'))).toBe(false)
    const second = await run()

    expect(second.seller).toEqual(first.seller)
    expect(statSync(join(dir, '.payments-booked')).mtimeMs).toBe(seeded)
    rmSync(dir, { recursive: true, force: true })
  })
