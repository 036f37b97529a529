import { createHash } from 'node:crypto'
import { ApiError, invalidRequest } from './api-error.ts'
import type { Books } from './books.ts'

export type Answer = { status: number; body: unknown; replayed: boolean }

/** How long a key is remembered. */
const REMEMBERED_MS = 24 * 60 * 60 * 1_000

export type Idempotency = ReturnType<typeof idempotencyLayer>

/**
 * The payment service's promise about idempotency keys: the first answer is given again, whatever it was; other
 * parameters under the same key are refused; so is a second call while the first is under way. A call that fails
 * validation, or is refused so, is not remembered.
 */
export function idempotencyLayer(books: Books, now: () => number) {
  const underWay = new Set<string>()
  const find = books.db.prepare('SELECT * FROM idempotency WHERE key = ?')
  const forget = books.db.prepare('DELETE FROM idempotency WHERE created_at <= ?')
  const remember = books.db.prepare(
    'INSERT INTO idempotency (key, endpoint, fingerprint, created_at, status, body) VALUES (?, ?, ?, ?, ?, ?)',
  )

  return {
    /**
     * Takes the key for the time of one call. Answers with the function that gives it free.
     * @throws ApiError 409 while another call holds it.
     */
    hold(key: string | null): () => void {
      if (key === null) return () => undefined
      if (key.length > 255) throw invalidRequest('Idempotency keys can be up to 255 characters long.')
      if (underWay.has(key))
        throw new ApiError(409, {
          type: 'idempotency_error',
          code: 'idempotency_key_in_use',
          message: `There is currently another in-progress request using this Idempotent Key (that probably means you submitted twice, and the other request is still going through): ${key}. Please try again later.`,
        })
      underWay.add(key)
      return () => void underWay.delete(key)
    },

    /**
     * @param prepare checks the parameters and answers with the deed; what it throws is not remembered, what the
     *   deed throws is.
     */
    run(
      call: { key: string | null; endpoint: string; encoded: string },
      prepare: () => () => unknown,
    ): Answer {
      return books.transaction(() => {
        forget.run(now() - REMEMBERED_MS)
        const fingerprint = fingerprintOf(call.encoded)
        const known = call.key === null ? undefined : (find.get(call.key) as Remembered | undefined)
        if (known) return replay(known, { ...call, fingerprint })
        const answer = carryOut(books, prepare())
        if (call.key !== null)
          remember.run(
            call.key,
            call.endpoint,
            fingerprint,
            now(),
            answer.status,
            JSON.stringify(answer.body),
          )
        return answer
      })
    },
  }
}

type Remembered = { key: string; endpoint: string; fingerprint: string; status: number; body: string }

function replay(known: Remembered, call: { endpoint: string; fingerprint: string }): Answer {
  const refused = (message: string) => new ApiError(400, { type: 'idempotency_error', message })
  if (known.endpoint !== call.endpoint)
    throw refused(
      `Keys for idempotent requests can only be used for the same endpoint they were first used for ('${known.endpoint}'). Try using a key other than '${known.key}' if you meant to execute a different request.`,
    )
  if (known.fingerprint !== call.fingerprint)
    throw refused(
      `Keys for idempotent requests can only be used with the same parameters they were first used with. Try using a key other than '${known.key}' if you meant to execute a different request.`,
    )
  return { status: known.status, body: JSON.parse(known.body), replayed: true }
}

function carryOut(books: Books, deed: () => unknown): Answer {
  try {
    return { status: 200, body: books.transaction(deed), replayed: false }
  } catch (error) {
    if (error instanceof ApiError) return { status: error.status, body: error.body, replayed: false }
    throw error
  }
}

/** The same for the same parameters in whatever order they came. */
function fingerprintOf(encoded: string): string {
  const pairs = [...new URLSearchParams(encoded)].map(pair => JSON.stringify(pair)).sort()
  return createHash('sha256').update(pairs.join('\n')).digest('hex')
}
