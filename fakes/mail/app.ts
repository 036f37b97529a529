import { closeServer, listen } from '../listen.ts'
import { mailBehaviour } from './behaviour.ts'
import { httpSide } from './http-side.ts'
import { openMailbox } from './mailbox.ts'
import { startSmtp } from './smtp-side.ts'

export type MailFakeOptions = {
  /** 0 takes a free one. */
  httpPort: number
  smtpPort: number
  /** Letters are kept in `mail-fake/` below this folder. */
  dataDir: string
  /** The clock that letters are dated by, in milliseconds since 1970 UTC; by default the machine's. */
  now?: () => number
}

/** Starts the mail catcher: SMTP in; a page for people and JSON for tests out. */
export async function startMailFake(options: MailFakeOptions): Promise<{
  httpUrl: string
  smtpPort: number
  close(): Promise<void>
}> {
  const mailbox = openMailbox(options.dataDir)
  const behaviour = mailBehaviour()
  const now = options.now ?? Date.now
  try {
    const smtp = await startSmtp({ port: options.smtpPort, mailbox, behaviour, now })
    const http = await listen(httpSide(mailbox, behaviour), options.httpPort).catch(async error => {
      await smtp.close()
      throw error
    })
    return {
      httpUrl: `http://127.0.0.1:${http.port}`,
      smtpPort: smtp.port,
      async close() {
        await Promise.all([smtp.close(), closeServer(http.server)])
        mailbox.close()
      },
    }
  } catch (error) {
    mailbox.close()
    throw error
  }
}
