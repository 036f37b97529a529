import { createTransport } from 'nodemailer'
import type { Config } from '../config.ts'

export type Letter = {
  to: { name: string; address: string }
  subject: string
  html: string
  text: string
  /** The same at every try of the same letter. */
  messageId: string
  replyTo?: { name: string; address: string } | undefined
  headers?: Record<string, string> | undefined
}

export type Mailer = ReturnType<typeof makeMailer>

/** Hands letters to the mail server. Exactly one recipient each; never a file or an address to fetch. */
export function makeMailer(config: Config) {
  const url = new URL(config.mail.smtpUrl)
  const transport = createTransport({
    host: url.hostname,
    port: Number(url.port || (url.protocol === 'smtps:' ? 465 : 587)),
    secure: url.protocol === 'smtps:',
    ...(config.mode === 'production'
      ? { requireTLS: url.protocol === 'smtp:' }
      : { ignoreTLS: url.protocol === 'smtp:' }),
    ...(url.username && {
      auth: { user: decodeURIComponent(url.username), pass: decodeURIComponent(url.password) },
    }),
    pool: true,
    maxConnections: 2,
    connectionTimeout: 10_000,
    greetingTimeout: 10_000,
    socketTimeout: 30_000,
    disableFileAccess: true,
    disableUrlAccess: true,
  })
  const from = { name: 'Tallykin', address: config.mail.from }

  return {
    /** Resolves with the mail server's own answer once it has taken the letter. */
    async send(letter: Letter): Promise<string> {
      const sent = await transport.sendMail({
        from,
        to: letter.to,
        envelope: { from: from.address, to: letter.to.address },
        subject: letter.subject,
        html: letter.html,
        text: letter.text,
        messageId: letter.messageId,
        ...(letter.replyTo && { replyTo: letter.replyTo }),
        headers: { 'Auto-Submitted': 'auto-generated', ...letter.headers },
      })
      return sent.response
    },
    async isReachable(): Promise<boolean> {
      try {
        return await transport.verify()
      } catch {
        return false
      }
    },
    close() {
      transport.close()
    },
  }
}
