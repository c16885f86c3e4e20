/** A refusal in the shape that the SDK turns into its own errors. */
export class ServiceError extends Error {
  override name = 'ServiceError'
  readonly status: number
  readonly body: {
    error: { type: string; message: string; code?: string; param?: string; decline_code?: string }
  }

  constructor(status: number, error: ServiceError['body']['error']) {
    super(error.message)
    this.status = status
    this.body = { error }
  }
}

export const invalidRequest = (message: string, param?: string) =>
  new ServiceError(400, { type: 'invalid_request_error', message, ...(param && { param }) })

export const missing = (what: string, id: string) =>
  new ServiceError(404, {
    type: 'invalid_request_error',
    code: 'resource_missing',
    message: `No such ${what}: '${id}'`,
    param: 'id',
  })

export const cardDeclined = (declineCode: string) =>
  new ServiceError(402, {
    type: 'card_error',
    code: 'card_declined',
    decline_code: declineCode,
    message: 'Your card was declined.',
  })
