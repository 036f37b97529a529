import { setTimeout as sleep } from 'node:timers/promises'
import { type ParsedMail, simpleParser } from 'mailparser'
import { SMTPServer, type SMTPServerDataStream, type SMTPServerSession } from 'smtp-server'
import type { MailBehaviourSwitch } from './behaviour.ts'
import type { Mailbox, Message } from './mailbox.ts'

const LARGEST_BYTES = 25 * 1024 * 1024

/** Takes mail by SMTP, without sign-in or encryption, for any recipient at all. */
export async function startSmtp(options: {
  port: number
  mailbox: Mailbox
  behaviour: MailBehaviourSwitch
  now: () => number
}): Promise<{ port: number; close(): Promise<void> }> {
  const { mailbox, behaviour } = options
  const closing = new AbortController()

  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS', 'AUTH'],
    disableReverseLookup: true,
    banner: 'Mail catcher, a stand-in',
    size: LARGEST_BYTES,
    logger: false,
    closeTimeout: 200,
    onRcptTo(_address, _session, callback) {
      if (behaviour.use('refuseNext')) return callback(refusal(451, 'Not now, try again later'))
      if (behaviour.use('rejectNext')) return callback(refusal(550, 'There is no such mailbox'))
      callback()
    },
    onData(stream, session, callback) {
      if (behaviour.use('dropConnectionNext')) {
        stream.resume()
        return cut(session)
      }
      take(stream, session).then(
        message => (behaviour.use('loseAnswerNext') ? cut(session) : callback(null, `Kept as ${message.id}`)),
        error => callback(error),
      )
    },
  })
  // A client that goes away in the middle is no problem of the catcher's.
  server.on('error', () => undefined)

  async function take(stream: SMTPServerDataStream, session: SMTPServerSession): Promise<Message> {
    const mail = await simpleParser(stream, { skipHtmlToText: true, skipTextToHtml: true })
    if (stream.sizeExceeded) throw refusal(552, 'The letter is too large')
    const { latencyMs } = behaviour.current
    if (latencyMs > 0) await sleep(latencyMs, undefined, { signal: closing.signal })
    if (closing.signal.aborted) throw refusal(421, 'The catcher is stopping')
    const { mailFrom, rcptTo } = session.envelope
    return mailbox.add({
      to: rcptTo.map(recipient => recipient.address).join(', '),
      from: mail.from?.value[0]?.address ?? (mailFrom ? mailFrom.address : ''),
      subject: mail.subject ?? '',
      date: new Date(options.now()).toISOString(),
      text: mail.text ?? '',
      html: mail.html || '',
      headers: headersOf(mail),
      attachments: mail.attachments
        .filter(part => !part.related)
        .map(part => ({ name: part.filename ?? 'unnamed', type: part.contentType, bytes: part.size })),
    })
  }

  function cut(session: SMTPServerSession): void {
    for (const connection of server.connections)
      if (connection.id === session.id) connection._socket.destroy()
  }

  await new Promise<void>((resolve, reject) => {
    server.server.once('error', reject)
    server.listen(options.port, '127.0.0.1', resolve)
  })
  const address = server.server.address()
  return {
    port: typeof address === 'object' && address ? address.port : options.port,
    async close() {
      closing.abort()
      for (const connection of server.connections) connection._socket.destroy()
      await new Promise<void>(resolve => server.close(() => resolve()))
    },
  }
}

function refusal(responseCode: number, message: string): Error {
  return Object.assign(new Error(message), { responseCode })
}

/** Lower-case names. Text that was encoded for the wire is decoded; the rest stands as it came, on one line. */
function headersOf(mail: ParsedMail): Record<string, string> {
  const headers: Record<string, string> = {}
  for (const { key, line } of mail.headerLines) {
    const raw = line.slice(line.indexOf(':') + 1).replace(/\r?\n[ \t]+/g, ' ')
    const read = mail.headers.get(key)
    const value = (typeof read === 'string' ? read : raw).trim()
    headers[key] = headers[key] === undefined ? value : `${headers[key]}, ${value}`
  }
  return headers
}
