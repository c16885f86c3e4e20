import type { ErrorCode } from '../../shared/contracts/errors.ts'

/** An error that is an answer: a stable code, an HTTP status and a sentence that a coach understands. */
export class NamedError extends Error {
  override name = 'NamedError'
  readonly code: ErrorCode
  readonly status: number
  readonly details: Record<string, unknown> | undefined

  constructor(code: ErrorCode, status: number, message: string, details?: Record<string, unknown>) {
    super(message)
    this.code = code
    this.status = status
    this.details = details
  }
}

export const namedError = (
  code: ErrorCode,
  status: number,
  message: string,
  details?: Record<string, unknown>,
) => new NamedError(code, status, message, details)

/** `fields`: path of the field → what is wrong with it. */
export const invalidRequest = (message: string, fields: Record<string, string> = {}) =>
  namedError('invalid-request', 400, message, fields)

export const notSignedIn = () => namedError('not-signed-in', 401, 'Sign in to go on.')

export const notAllowed = (message = 'Your role in this club does not allow that.') =>
  namedError('not-allowed', 403, message)

export const notFound = (what = 'This') =>
  namedError('not-found', 404, `${what} is not here. It may belong to another club, or the link is wrong.`)

/** `newer` is the row as it stands now, in the form its endpoint answers with. */
export const staleVersion = (newer: unknown) =>
  namedError(
    'stale-version',
    409,
    'Somebody changed this since you opened it. Look at it again, then save.',
    {
      newer,
    },
  )

export const crossSiteRequest = () =>
  namedError('cross-site-request', 403, 'This request came from another site and was refused.')

export const internalError = () =>
  namedError('internal', 500, 'Something went wrong on our side. Nothing was saved; try again in a moment.')
