import { startMailFake } from '../../fakes/mail/app.ts'
import { startPaymentFake } from '../../fakes/payments/app.ts'
import { SECRET_KEY, WEBHOOK_SECRET } from './start-app.ts'

export type CaughtMail = {
  id: string
  to: string
  from: string
  subject: string
  text: string
  html: string
  headers: Record<string, string>
}

/** The payment stand-in and the mail catcher, on ports of their own, with their test doors as functions. */
export async function makeFakes(options: { dir: string; now: () => number }) {
  const target = { url: 'http://127.0.0.1:9' }
  const payments = await startPaymentFake({
    port: 0,
    dataDir: options.dir,
    webhookUrl: () => `${target.url}/api/webhooks/payments`,
    webhookSecret: WEBHOOK_SECRET,
    secretKey: SECRET_KEY,
    now: options.now,
  })
  const mail = await startMailFake({ httpPort: 0, smtpPort: 0, dataDir: options.dir, now: options.now })
  const call = async (base: string, method: string, path: string, body?: unknown) => {
    const response = await fetch(base + path, {
      method,
      headers: { 'Content-Type': 'application/json' },
      ...(body !== undefined && { body: JSON.stringify(body) }),
    })
    const text = await response.text()
    return { status: response.status, body: text ? JSON.parse(text) : null }
  }
  return {
    payments,
    mail,
    announceTo(url: string) {
      target.url = url
    },
    sessions: async () => (await call(payments.url, 'GET', '/_test/sessions')).body as any[],
    refunds: async () => (await call(payments.url, 'GET', '/_test/refunds')).body as any[],
    events: async () => (await call(payments.url, 'GET', '/_test/events')).body as any[],
    pay: (sessionId: string, card = '4242424242424242') =>
      call(payments.url, 'POST', `/_test/sessions/${sessionId}/pay`, { card }),
    expire: (sessionId: string) => call(payments.url, 'POST', `/_test/sessions/${sessionId}/expire`, {}),
    resend: (eventId: string) => call(payments.url, 'POST', `/_test/events/${eventId}/resend`, {}),
    behave: (behaviour: Record<string, unknown>) => call(payments.url, 'POST', '/_test/behaviour', behaviour),
    mailbox: async () => (await call(mail.httpUrl, 'GET', '/messages')).body as CaughtMail[],
    behaveMail: (behaviour: Record<string, unknown>) => call(mail.httpUrl, 'POST', '/behaviour', behaviour),
    async close() {
      await Promise.all([payments.close(), mail.close()])
    },
  }
}
