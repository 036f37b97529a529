import { clockFrom } from '../clock.ts'
import { portFrom, runProcess } from '../run-process.ts'
import { startMailFake } from './app.ts'

await runProcess(async () => {
  const httpPort = portFrom('MAIL_HTTP_PORT', 4312)
  const fake = await startMailFake({
    httpPort,
    smtpPort: portFrom('MAIL_SMTP_PORT', 4313),
    dataDir: process.env.DATA_DIR || './data',
    now: clockFrom(process.env.TALLYKIN_NOW),
  })
  const { port } = new URL(fake.httpUrl)
  return {
    lines: [
      `Mail catcher: http://localhost:${port} (SMTP at localhost:${fake.smtpPort}; mail goes no further)`,
    ],
    close: fake.close,
  }
})
