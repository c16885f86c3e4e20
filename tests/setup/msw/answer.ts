import { http, HttpResponse, type HttpHandler } from 'msw'
import type { z } from 'zod'
import type { Endpoint } from '../../../shared/contracts/endpoint.ts'
import type { ErrorCode } from '../../../shared/contracts/errors.ts'

/** Thrown by an answer to refuse the call. */
export class Refusal extends Error {
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

export interface Call<P, Q, B> {
  params: P
  query: Q
  body: B
  idempotencyKey: string | null
}

type Answer<P, Q, B, R> = (call: Call<P, Q, B>) => R | Promise<R>

/**
 * A handler that holds both sides to the contract: what the client sends is parsed as the server would, a mutation
 * without its Idempotency-Key is refused, and what the test answers must pass the response's schema.
 */
export function answer<
  P extends z.ZodObject,
  Q extends z.ZodObject,
  B extends z.ZodType,
  R extends z.ZodType,
>(
  endpoint: Endpoint<P, Q, B, R>,
  respond: Answer<z.output<P>, z.output<Q>, z.output<B>, z.input<R>>,
): HttpHandler {
  const method = endpoint.method.toLowerCase() as 'get' | 'post' | 'patch' | 'put' | 'delete'
  return http[method](`*${endpoint.path}`, async ({ request, params }) => {
    const idempotencyKey = request.headers.get('idempotency-key')
    const wantsKey = endpoint.repeat === 'key' && endpoint.method !== 'GET'
    if (wantsKey && !/^[\w-]{16,100}$/.test(idempotencyKey ?? '')) {
      return refusal(new Refusal('idempotency-key-missing', 400, 'No Idempotency-Key was sent.'))
    }
    try {
      const text = await request.text()
      const result = await respond({
        params: endpoint.params.parse(named(params)),
        query: endpoint.query.parse(Object.fromEntries(new URL(request.url).searchParams)),
        body: endpoint.body.parse(text === '' ? null : JSON.parse(text)),
        idempotencyKey,
      })
      return HttpResponse.json(endpoint.response.parse(result) as never)
    } catch (error) {
      if (error instanceof Refusal) return refusal(error)
      console.error(`${endpoint.method} ${endpoint.path} breaks the contract: ${String(error)}`)
      return HttpResponse.error()
    }
  })
}

/** Without what the leading `*` of the address stands for. */
function named(params: Record<string, unknown>) {
  return Object.fromEntries(Object.entries(params).filter(([name]) => name !== '0'))
}

function refusal({ code, status, message, details }: Refusal) {
  return HttpResponse.json({ error: { code, message, ...(details ? { details } : {}) } }, { status })
}

/** A handler that refuses whatever is asked of an endpoint. */
export function refuse(
  endpoint: { method: string; path: string },
  code: ErrorCode,
  status: number,
  message = 'Refused for the test.',
  details?: Record<string, unknown>,
): HttpHandler {
  const method = endpoint.method.toLowerCase() as 'get' | 'post' | 'patch' | 'put' | 'delete'
  return http[method](`*${endpoint.path}`, () => refusal(new Refusal(code, status, message, details)))
}

/** A handler that answers as a cut line would: not at all. */
export function cutOff(endpoint: { method: string; path: string }): HttpHandler {
  const method = endpoint.method.toLowerCase() as 'get' | 'post' | 'patch' | 'put' | 'delete'
  return http[method](`*${endpoint.path}`, () => HttpResponse.error())
}

/** A handler whose answer never comes, for looking at what is shown meanwhile. */
export function neverAnswers(endpoint: { method: string; path: string }): HttpHandler {
  const method = endpoint.method.toLowerCase() as 'get' | 'post' | 'patch' | 'put' | 'delete'
  return http[method](`*${endpoint.path}`, () => new Promise<never>(() => {}))
}
