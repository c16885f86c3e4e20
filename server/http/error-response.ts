import type { ErrorRequestHandler, RequestHandler } from 'express'
import type { ErrorBody } from '../../shared/contracts/errors.ts'
import { internalError, invalidRequest, NamedError, namedError, notFound } from './errors.ts'

/** What Express's own middleware throws: a status, and a type where the body could not be read. */
interface HttpError {
  status: number
  type?: string
}
const isHttpError = (error: unknown): error is HttpError =>
  error instanceof Error && 'status' in error && typeof error.status === 'number'

/** Any path of the API that no endpoint answers. */
export const answerNotFound: RequestHandler = () => {
  throw notFound('What was asked for')
}

/** The one place that makes an error's JSON. What has no name of ours is a plain 500, and is logged. */
export const answerError: ErrorRequestHandler = (error: unknown, req, res, next) => {
  const named = nameOf(error)
  if (named.status >= 500) req.log.error({ err: error }, 'request failed')
  if (res.headersSent) return next(error)
  const { code, message, details } = named
  if (typeof details?.retryAfterS === 'number') res.set('Retry-After', String(details.retryAfterS))
  const body: ErrorBody = { error: details ? { code, message, details } : { code, message } }
  res.status(named.status).json(body)
}

function nameOf(error: unknown): NamedError {
  if (error instanceof NamedError) return error
  if (isHttpError(error) && error.status < 500) return nameOfHttpError(error)
  return internalError()
}

function nameOfHttpError({ type, status }: HttpError): NamedError {
  if (type === 'entity.too.large')
    return namedError('invalid-request', 413, 'What was sent is larger than the server takes.')
  if (type === 'entity.parse.failed') return invalidRequest('What was sent is not valid JSON.')
  return namedError('invalid-request', status, 'This request could not be read.')
}
