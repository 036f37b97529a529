import { z } from 'zod'
import { problem } from '#shared/wire.ts'
import type { Access, AnyRoute } from './route.ts'

/** The published description of every `/api` route, made from the same list the server mounts. */
export function toOpenApi(routes: readonly AnyRoute[]) {
  const paths: Record<string, Record<string, unknown>> = {}
  for (const spec of routes) {
    const path = `/api${spec.path.replace(/:(\w+)/g, '{$1}')}`
    paths[path] ??= {}
    paths[path][spec.method] = {
      summary: spec.summary,
      'x-access': toAccessNames(spec.access),
      parameters: [
        ...[...spec.path.matchAll(/:(\w+)/g)].map(([, name]) => ({
          name,
          in: 'path',
          required: true,
          schema: { type: 'string' },
        })),
        ...queryParameters(spec),
        ...Object.entries(spec.headers ?? {}).map(([name, description]) => ({
          name,
          in: 'header',
          required: true,
          description,
          schema: { type: 'string' },
        })),
      ],
      ...(spec.body && {
        requestBody: {
          required: true,
          content: { 'application/json': { schema: toSchema(spec.body, 'input') } },
        },
      }),
      responses: {
        ...Object.fromEntries(
          Object.entries(spec.replies).map(([status, schema]) => [
            status,
            {
              description: 'As asked',
              content: { 'application/json': { schema: toSchema(schema, 'output') } },
            },
          ]),
        ),
        default: {
          description: 'A refusal',
          content: { 'application/problem+json': { schema: toSchema(problem, 'output') } },
        },
      },
    }
  }
  return {
    openapi: '3.1.0',
    info: {
      title: 'Tallykin',
      version: '1',
      description: 'Every route of the server, with who may call it.',
    },
    paths,
  }
}

/** The words of `x-access`: each names a kind of caller. */
export function toAccessNames(access: Access): string[] {
  switch (access.who) {
    case 'drive':
      return [...access.roles, ...access.staff]
    case 'staff':
      return [...access.roles]
    default:
      return [access.who]
  }
}

function queryParameters(spec: AnyRoute) {
  if (!spec.query) return []
  const schema = toSchema(spec.query, 'input') as {
    properties?: Record<string, unknown>
    required?: string[]
  }
  return Object.entries(schema.properties ?? {}).map(([name, property]) => ({
    name,
    in: 'query',
    required: schema.required?.includes(name) ?? false,
    schema: property,
  }))
}

function toSchema(schema: z.ZodType, io: 'input' | 'output') {
  const { $schema: _, ...rest } = z.toJSONSchema(schema, {
    io,
    unrepresentable: 'any',
    target: 'draft-2020-12',
  })
  return rest
}
