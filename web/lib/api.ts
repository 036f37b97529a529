import type { Problem } from '#shared/wire.ts'

/** A refusal of the server, with its sentence and the fields that need mending; `status` 0 means no answer came. */
export class ApiError extends Error {
  readonly status: number
  readonly code: string
  readonly fields: { path: string; message: string }[]
  readonly totalCents: number | undefined

  constructor(status: number, problem: Partial<Problem>) {
    super(problem.detail ?? '')
    this.name = 'ApiError'
    this.status = status
    this.code = problem.code ?? (status === 0 ? 'unreachable' : 'internal')
    this.fields = problem.errors ?? []
    this.totalCents = problem.totalCents
  }
}

/** Asks the server and reads its answer; every refusal comes back as an `ApiError`. */
export async function request<T>(
  method: 'GET' | 'POST',
  path: string,
  body?: unknown,
  headers: Record<string, string> = {},
): Promise<T> {
  let response: Response
  try {
    response = await fetch(path, {
      method,
      headers: {
        Accept: 'application/json',
        ...(body !== undefined && { 'Content-Type': 'application/json' }),
        ...headers,
      },
      ...(body !== undefined && { body: JSON.stringify(body) }),
      signal: AbortSignal.timeout(40_000),
    })
  } catch {
    throw new ApiError(0, {})
  }
  const text = await response.text()
  const isJson = /json/.test(response.headers.get('content-type') ?? '')
  const answer = isJson && text !== '' ? JSON.parse(text) : {}
  if (!response.ok) throw new ApiError(response.status, answer)
  return answer as T
}

export const get = <T>(path: string) => request<T>('GET', path)
export const post = <T>(path: string, body: unknown, headers?: Record<string, string>) =>
  request<T>('POST', path, body, headers)
