import { STATUS_CODES } from 'node:http'
import type { ErrorRequestHandler, Request, Response } from 'express'
import type { Logger } from 'pino'
import { AppError, type ErrorCode } from '#shared/errors.ts'
import { refusal } from '#shared/messages/refusals.ts'

const statusOf: Record<ErrorCode, number> = {
  invalid_input: 400,
  not_found: 404,
  not_signed_in: 401,
  not_allowed: 403,
  second_factor_needed: 403,
  cross_site: 403,
  method_not_allowed: 405,
  unsupported_media_type: 415,
  too_large: 413,
  too_many_requests: 429,
  store_not_open: 409,
  store_paused: 409,
  store_closed: 409,
  total_changed: 409,
  item_unavailable: 409,
  key_reused: 409,
  in_progress: 409,
  conflict: 409,
  payments_stopped: 503,
  payment_service_unreachable: 503,
  busy: 503,
  internal: 500,
}

const sentences: Record<ErrorCode, string> = {
  invalid_input: refusal('somethingInThisRequestNeedsMending'),
  not_found: refusal('thereIsNothingAtThisAddress'),
  not_signed_in: refusal('pleaseSignInFirst'),
  not_allowed: refusal('yourAccountMayNotDoThis'),
  second_factor_needed: refusal('pleaseSetUpYourSecondFactor'),
  cross_site: refusal('thisRequestCameFromAnotherSite'),
  method_not_allowed: refusal('thisAddressDoesNotTakeThat'),
  unsupported_media_type: refusal('sendJsonEncodedAsUtf8'),
  too_large: refusal('thisIsLargerThanWhatCan'),
  too_many_requests: refusal('tooManyRequestsInAShort'),
  store_not_open: refusal('thisStoreIsNotOpenYet'),
  store_paused: refusal('thisStoreIsPausedNothingWas'),
  store_closed: refusal('thisStoreHasClosedNothingWas'),
  total_changed: refusal('pricesHaveChangedNothingWasOrdered'),
  item_unavailable: refusal('anItemIsNoLongerAvailable'),
  key_reused: refusal('thisKeyWasAlreadyUsedFor'),
  in_progress: refusal('thisOrderIsBeingPlacedRight'),
  conflict: refusal('thisWasChangedBySomebodyElse'),
  payments_stopped: refusal('paymentsForThisFundraiserAreOn'),
  payment_service_unreachable: refusal('thePaymentServiceDoesNotAnswer'),
  busy: refusal('theServerIsBusyPleaseTry'),
  internal: refusal('somethingWentWrongOnOurSide'),
}

export function statusOfCode(code: ErrorCode): number {
  return statusOf[code]
}

/** Writes a refusal as a problem document. Nothing but its code's own words and the given details gets out. */
export function sendProblem(res: Response, error: AppError, requestId: string) {
  const status = statusOf[error.code]
  const { detail, retryAfterSeconds, ...facts } = error.details
  if (retryAfterSeconds !== undefined) res.setHeader('Retry-After', String(retryAfterSeconds))
  res.status(status)
  res.setHeader('Content-Type', 'application/problem+json; charset=utf-8')
  res.setHeader('Cache-Control', 'no-store')
  res.end(
    JSON.stringify({
      type: `/problems/${error.code}`,
      title: STATUS_CODES[status],
      status,
      detail: detail ?? sentences[error.code],
      code: error.code,
      requestId,
      ...facts,
    }),
  )
}

/** Turns whatever was thrown into a refusal; what is not one of ours is logged and told as "our side". */
export function toAppError(thrown: unknown, log: Logger, requestId: string): AppError {
  if (thrown instanceof AppError) return thrown
  const parserStatus = (thrown as { status?: unknown } | null)?.status
  if (parserStatus === 413) return new AppError('too_large')
  if (parserStatus === 415) return new AppError('unsupported_media_type')
  if (typeof parserStatus === 'number' && parserStatus >= 400 && parserStatus < 500)
    return new AppError('invalid_input', { detail: refusal('thisRequestCouldNotBeRead') })
  const code = (thrown as { code?: unknown } | null)?.code
  if (code === 'SQLITE_BUSY' || code === 'SQLITE_FULL' || code === 'SQLITE_READONLY') {
    log.error({ requestId, code }, 'database refused')
    return new AppError('busy', { retryAfterSeconds: 2 })
  }
  const error = thrown instanceof Error ? thrown : new Error('thrown value is no error')
  log.error(
    { requestId, error: { name: error.name, message: error.message, stack: error.stack } },
    'unexpected',
  )
  return new AppError('internal')
}

export function errorHandler(log: Logger): ErrorRequestHandler {
  return (thrown, req: Request, res: Response, next) => {
    if (res.headersSent) return next(thrown)
    const requestId = String(res.locals.requestId ?? '')
    const error = toAppError(thrown, log, requestId)
    // The rest of an unread body is not worth waiting for.
    if (error.code === 'too_large') req.resume()
    sendProblem(res, error, requestId)
  }
}
