import { createHash } from 'node:crypto'
import { findCall } from './api.ts'
import type { Books } from './books.ts'
import { parseForm } from './form-body.ts'
import { ServiceError } from './service-error.ts'

export interface ApiRequest {
  method: string
  /** Without the query. */
  path: string
  /** The query of a GET, the form of a POST. */
  form: string
  secretKey: string | undefined
  idempotencyKey: string | undefined
}

export interface ApiAnswer {
  status: number
  body: unknown
  replayed?: boolean
}

/** Answers one call of the API as the hosted service does: the key, the idempotency key, then the act. */
export function answerCall(books: Books, request: ApiRequest): ApiAnswer {
  try {
    if (!request.secretKey?.startsWith('sk_test_')) {
      throw new ServiceError(401, { type: 'invalid_request_error', message: 'Invalid API Key provided.' })
    }
    return request.method === 'POST' && request.idempotencyKey ? once(books, request) : act(books, request)
  } catch (error) {
    if (error instanceof ServiceError) return { status: error.status, body: error.body }
    throw error
  }
}

/** The same key again gets the first answer again, also where that was a refusal; with another request, an error. */
function once(books: Books, request: ApiRequest): ApiAnswer {
  const { answers } = books.state
  const key = request.idempotencyKey ?? ''
  const hash = createHash('sha256').update(`${request.method} ${request.path}\n${request.form}`).digest('hex')
  const earlier = Object.hasOwn(answers, key) ? answers[key] : undefined
  if (earlier && earlier.request !== hash) {
    const message =
      'Keys for idempotent requests can only be used with the same parameters they were first used with.'
    throw new ServiceError(400, { type: 'idempotency_error', message })
  }
  if (earlier) return { status: earlier.status, body: earlier.body, replayed: true }
  const answer = act(books, request)
  answers[key] = { request: hash, status: answer.status, body: structuredClone(answer.body) }
  return answer
}

function act(books: Books, { method, path, form }: ApiRequest): ApiAnswer {
  const call = findCall(method, path)
  if (!call) {
    const message = `Unrecognized request URL (${method}: ${path}): the product is not known to make this call.`
    throw new ServiceError(404, { type: 'invalid_request_error', message })
  }
  try {
    return { status: 200, body: call(books, parseForm(form)) }
  } catch (error) {
    if (error instanceof ServiceError) return { status: error.status, body: error.body }
    throw error
  }
}
