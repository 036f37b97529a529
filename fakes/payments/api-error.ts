export type ApiErrorBody = {
  error: { type: string; code?: string; message: string; param?: string; decline_code?: string } & Record<
    string,
    unknown
  >
}

/** A refusal in the payment API's own shape, with its HTTP status. */
export class ApiError extends Error {
  readonly status: number
  readonly body: ApiErrorBody
  constructor(status: number, error: ApiErrorBody['error']) {
    super(error.message)
    this.name = 'ApiError'
    this.status = status
    this.body = { error }
  }
}

/** The caller asked for something that cannot be done: 400 with the parameter at fault. */
export function invalidRequest(message: string, more: { code?: string; param?: string } = {}): ApiError {
  return new ApiError(400, { type: 'invalid_request_error', message, ...more })
}

export function notFound(what: string, id: string): ApiError {
  const message = `No such ${what}: '${id}'`
  return new ApiError(404, { type: 'invalid_request_error', code: 'resource_missing', param: 'id', message })
}

export function serverError(message: string, status = 500): ApiError {
  return new ApiError(status, { type: 'api_error', message })
}
