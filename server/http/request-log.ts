import { randomUUID } from 'node:crypto'
import type { RequestHandler } from 'express'
import type { Logger } from 'pino'

/** Parts of a path that open something; the log keeps the kind of address and never the key. */
const SECRET_PATHS = /^(\/(?:api\/)?(?:s|r|stores|receipts|pictures)\/)[^/?]+/

/** Path without its secrets and without its query. */
export function pathForLog(path: string): string {
  return path.replace(SECRET_PATHS, '$1…')
}

/** Gives every request an id and writes one line when it is answered: no address, no name, no token. */
export function requestLog(log: Logger): RequestHandler {
  return (req, res, next) => {
    const requestId = randomUUID()
    const begun = performance.now()
    res.locals.requestId = requestId
    res.setHeader('X-Request-Id', requestId)
    res.on('finish', () => {
      const line = {
        requestId,
        method: req.method,
        path: pathForLog(req.originalUrl.split('?')[0] ?? ''),
        status: res.statusCode,
        ms: Math.round((performance.now() - begun) * 10) / 10,
      }
      if (res.statusCode >= 500) log.error(line, 'answered')
      else log.info(line, 'answered')
    })
    next()
  }
}
