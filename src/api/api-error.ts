import type { ErrorCode } from '../../shared/contracts/errors.ts'

/** What can go wrong before the server has a say. */
export type ClientErrorCode = 'no-answer' | 'answer-unreadable'
export type AnyErrorCode = ErrorCode | ClientErrorCode

/** A refused or failed call: `code` to act on, `message` and `details` as the server sent them. */
export class ApiError extends Error {
  readonly code: AnyErrorCode
  readonly details: Record<string, unknown>

  constructor(code: AnyErrorCode, message: string, details: Record<string, unknown> = {}) {
    super(message)
    this.name = 'ApiError'
    this.code = code
    this.details = details
  }
}

export function isApiError(error: unknown, code?: AnyErrorCode): error is ApiError {
  return error instanceof ApiError && (code === undefined || error.code === code)
}
