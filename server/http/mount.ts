import express, { type Express, type Request, type Response } from 'express'
import type { z } from 'zod'
import { AppError, type FieldProblem } from '#shared/errors.ts'
import { refusal } from '#shared/messages/refusals.ts'
import type { Deps } from '../deps.ts'
import { grant } from '../people/grant.ts'
import type { AnyRoute } from './route.ts'
import { refuseCrossSite } from './same-origin.ts'

const MAX_DEPTH = 20
const MAX_PROBLEMS = 50

/**
 * Mounts the declared routes below `/api`.
 *
 * @throws Error naming the first route that declares no access, or declares it twice.
 */
export function mountRoutes(app: Express, deps: Deps, routes: readonly AnyRoute[]) {
  const json = express.json({ limit: '64kb', strict: true, type: 'application/json' })
  const raw = express.raw({ limit: '1mb', type: () => true, inflate: false })
  const seen = new Set<string>()
  for (const spec of routes) {
    const name = `${spec.method.toUpperCase()} /api${spec.path}`
    if (!spec.access?.who) throw new Error(`${name} declares no access`)
    if (seen.has(name)) throw new Error(`${name} is declared twice`)
    seen.add(name)
    const readBody = spec.rawBody ? [raw] : spec.body ? [requireJson, json] : []
    app[spec.method](
      `/api${spec.path}`,
      (req: Request, _res: Response, next) => {
        if (spec.method !== 'get') refuseCrossSite(req, deps.config, spec.access.who)
        next()
      },
      ...readBody,
      async (req: Request, res: Response) => {
        await serve(spec, deps, req, res)
      },
    )
  }
  const paths = new Map<string, string[]>()
  for (const spec of routes)
    paths.set(spec.path, [...(paths.get(spec.path) ?? []), spec.method.toUpperCase()])
  for (const [path, methods] of paths)
    app.all(`/api${path}`, (req, res) => {
      if (req.method === 'HEAD' && methods.includes('GET')) throw new AppError('not_found')
      res.setHeader('Allow', methods.join(', '))
      throw new AppError('method_not_allowed')
    })
}

async function serve(spec: AnyRoute, deps: Deps, req: Request, res: Response) {
  const requestId = String(res.locals.requestId)
  // A path that is not well formed names nothing; it is answered like one that names nothing.
  const params = spec.params ? spec.params.safeParse(req.params) : undefined
  if (params && !params.success) throw new AppError('not_found')
  const granted = await grant(deps, spec.access, req)
  const query = spec.query ? parse(spec.query, { ...req.query }, 'query') : undefined
  if (spec.body) refuseDeep(req.body)
  const body = spec.body ? parse(spec.body, req.body, '') : undefined
  const answer = await spec.handler({
    deps,
    params: params?.data as never,
    query: query as never,
    body: body as never,
    rawBody: spec.rawBody ? req.body : undefined,
    granted,
    requestId,
    request: req,
    header: name => req.get(name)?.trim() || undefined,
  })
  const schema = spec.replies[answer.status]
  if (!schema) throw new Error(`${spec.path} declares no reply ${answer.status}`)
  for (const [header, value] of Object.entries(answer.headers ?? {})) res.setHeader(header, value)
  if (!res.hasHeader('Cache-Control')) res.setHeader('Cache-Control', 'private, no-store')
  res.status(answer.status)
  if (answer.body instanceof Buffer || typeof answer.body === 'string') {
    res.end(answer.body)
    return
  }
  res.setHeader('Content-Type', 'application/json; charset=utf-8')
  res.end(JSON.stringify(schema.parse(answer.body)))
}

function requireJson(req: Request, _res: Response, next: (error?: unknown) => void) {
  const type = req.headers['content-type'] ?? ''
  if (!/^application\/json\s*(;\s*charset=("?)utf-8\2\s*)?$/i.test(type))
    throw new AppError('unsupported_media_type')
  if (req.headers['content-encoding']) throw new AppError('unsupported_media_type')
  next()
}

/** Reads input by its schema and tells every problem, up to a sensible number, each with its place. */
function parse<S extends z.ZodType>(schema: S, input: unknown, prefix: string): z.output<S> {
  const result = schema.safeParse(input)
  if (result.success) return result.data
  const errors: FieldProblem[] = result.error.issues.slice(0, MAX_PROBLEMS).map(issue => ({
    path: [prefix, ...issue.path.map(String)].filter(part => part !== '').join('.'),
    message:
      issue.code === 'unrecognized_keys' ? `Unknown: ${issue.keys.slice(0, 5).join(', ')}` : issue.message,
  }))
  throw new AppError('invalid_input', { errors })
}

/** Deeply nested input is never meant; checked before any schema walks into it. */
function refuseDeep(input: unknown) {
  let level: unknown[] = [input]
  for (let depth = 0; level.length > 0; depth++) {
    if (depth > MAX_DEPTH)
      throw new AppError('invalid_input', { detail: refusal('thisRequestIsNestedTooDeeply') })
    level = level.flatMap(value => (value !== null && typeof value === 'object' ? Object.values(value) : []))
  }
}
