import { randomBytes } from 'node:crypto'
import express, { type ErrorRequestHandler, type Express, type Request, type Response } from 'express'
import type { MailBehaviourSwitch } from './behaviour.ts'
import { framedLetter, mailPage, SHOWN } from './mail-page.ts'
import type { Mailbox, Note } from './mailbox.ts'

/** The catcher's doors for tests and its page for people. */
export function httpSide(mailbox: Mailbox, behaviour: MailBehaviourSwitch): Express {
  const app = express()
  app.disable('x-powered-by')
  app.use(express.json({ limit: '1mb', type: () => true }))

  app.get('/healthz', (_req, res) => {
    res.json({ status: 'ok' })
  })
  app.get('/messages', (_req, res) => {
    res.json(mailbox.list())
  })
  app.delete('/messages', (_req, res) => {
    mailbox.empty()
    res.status(204).end()
  })
  app.get('/messages/:id', (req, res) => {
    const message = mailbox.find(req.params.id)
    if (!message) return refuse(res, 404, 'There is no such letter.')
    res.json(message)
  })
  app.get('/messages/:id/html', (req, res) => {
    const message = mailbox.find(req.params.id)
    if (!message || message.html === '') return refuse(res, 404, 'There is no such letter.')
    // As a careful mail program: no script, no form, nothing but looks and pictures.
    res
      .set({
        'content-security-policy':
          "sandbox allow-popups allow-popups-to-escape-sandbox; default-src 'none'; style-src 'unsafe-inline'; img-src http: https: data:; font-src data:; frame-ancestors 'self'",
        'referrer-policy': 'no-referrer',
      })
      .type('html')
      .send(framedLetter(message.html))
  })

  app.get('/behaviour', (_req, res) => {
    res.json(behaviour.current)
  })
  app.post('/behaviour', (req, res) => {
    try {
      behaviour.change(req.body)
      res.json(behaviour.current)
    } catch (error) {
      if (!(error instanceof RangeError)) throw error
      refuse(res, 400, error.message)
    }
  })
  app.get('/notes', (_req, res) => {
    res.json(mailbox.notes())
  })
  app.post('/notes', (req, res) => {
    const note = noteIn(req)
    if (!note) return refuse(res, 400, 'Send {"title": "...", "rows": [{"label": "...", "value": "..."}]}.')
    mailbox.putNote(note)
    res.json(note)
  })

  app.get('/', (req, res) => {
    const id = typeof req.query.message === 'string' ? req.query.message : null
    const message = id === null ? null : mailbox.find(id)
    const nonce = randomBytes(16).toString('base64')
    res
      .status(id !== null && message === null ? 404 : 200)
      .set({
        'content-security-policy': `default-src 'none'; style-src 'nonce-${nonce}'; img-src data:; frame-src 'self'; base-uri 'none'; form-action 'none'; frame-ancestors 'none'`,
        'cache-control': 'no-store',
      })
      .send(
        mailPage({
          nonce,
          lines: mailbox.newest(SHOWN),
          count: mailbox.count(),
          notes: mailbox.notes(),
          message,
          asText: req.query.part === 'text',
        }),
      )
  })

  app.use((_req, res) => refuse(res, 404, 'Nothing is here.'))
  app.use(answerProblem)
  return app
}

function refuse(res: Response, status: number, error: string): void {
  res.status(status).json({ error })
}

function noteIn(req: Request): Note | null {
  const { title, rows } = (req.body ?? {}) as { title?: unknown; rows?: unknown }
  if (typeof title !== 'string' || title === '' || !Array.isArray(rows)) return null
  const isRow = (row: unknown): row is Note['rows'][number] => {
    const { label, value } = (row ?? {}) as Record<string, unknown>
    return typeof label === 'string' && typeof value === 'string'
  }
  return rows.every(isRow) ? { title, rows: rows.map(({ label, value }) => ({ label, value })) } : null
}

const answerProblem: ErrorRequestHandler = (error, _req, res, _next) => {
  const status = typeof error?.status === 'number' ? error.status : 500
  if (status >= 500) console.error(error)
  refuse(res, status, status >= 500 ? 'The mail catcher met a problem of its own.' : String(error.message))
}
