/**
 * Every refusal the server can make, by code. Codes are for machines; `detail` is a plain sentence for the
 * person, which says what happened, what was kept and what to do next.
 */
export const errorCodes = [
  'invalid_input',
  'not_found',
  'not_signed_in',
  'not_allowed',
  'second_factor_needed',
  'cross_site',
  'method_not_allowed',
  'unsupported_media_type',
  'too_large',
  'too_many_requests',
  'store_not_open',
  'store_paused',
  'store_closed',
  'total_changed',
  'item_unavailable',
  'key_reused',
  'in_progress',
  'conflict',
  'payments_stopped',
  'payment_service_unreachable',
  'busy',
  'internal',
] as const

export type ErrorCode = (typeof errorCodes)[number]

/** One field that needs mending: `path` is a JSON-pointer-like path ("customer.email"), `message` a sentence. */
export type FieldProblem = { path: string; message: string }

/** Facts a refusal may carry beside its sentence; all of them safe to show. */
export type ErrorDetails = {
  detail?: string
  errors?: FieldProblem[]
  totalCents?: number
  retryAfterSeconds?: number
  orderNumber?: string
  [fact: string]: unknown
}

/** Thrown by operations, turned into a problem document at the single exit of the server. */
export class AppError extends Error {
  readonly code: ErrorCode
  readonly details: ErrorDetails

  constructor(code: ErrorCode, details: ErrorDetails = {}) {
    super(details.detail ?? code)
    this.name = 'AppError'
    this.code = code
    this.details = details
  }
}
