import type { z } from 'zod'
import type { Endpoint } from '../../shared/contracts/endpoint.ts'
import { ErrorBody } from '../../shared/contracts/errors.ts'
import { ApiError } from './api-error.ts'

type Part<Name extends string, T> = Record<string, never> extends T ? { [K in Name]?: T } : { [K in Name]: T }
type BodyPart<T> = null extends T ? { body?: T } : { body: T }

/** What a call to an endpoint needs: only what its contract asks for, as it is sent. */
export type CallInput<P extends z.ZodObject, Q extends z.ZodObject, B extends z.ZodType> = Part<
  'params',
  z.input<P>
> &
  Part<'query', z.input<Q>> &
  BodyPart<z.input<B>>

export interface CallOptions {
  signal?: AbortSignal
  /** Tells a repeated act from a new one; see `act-keys.ts`. */
  idempotencyKey?: string
}

interface LooseInput {
  params?: Record<string, unknown>
  query?: Record<string, unknown>
  body?: unknown
}

/** The address of an endpoint with its parameters and query filled in. */
export function addressOf(endpoint: { path: string }, input: LooseInput): string {
  const path = endpoint.path.replace(/:(\w+)/g, (_, name: string) =>
    encodeURIComponent(String(input.params?.[name])),
  )
  const query = Object.entries(input.query ?? {}).flatMap(([name, value]) =>
    value === undefined || value === '' ? [] : [[name, String(value)]],
  )
  return query.length === 0 ? path : `${path}?${new URLSearchParams(query)}`
}

function requestOf(method: string, body: unknown, options: CallOptions): RequestInit {
  const headers = new Headers({ accept: 'application/json' })
  if (options.idempotencyKey !== undefined) headers.set('idempotency-key', options.idempotencyKey)
  const request: RequestInit = { method, headers, credentials: 'same-origin', signal: options.signal ?? null }
  if (body === undefined || body === null) return request
  if (body instanceof FormData) return { ...request, body }
  headers.set('content-type', 'application/json')
  return { ...request, body: JSON.stringify(body) }
}

async function readJson(response: Response): Promise<unknown> {
  const text = await response.text()
  if (text === '') return null
  try {
    return JSON.parse(text)
  } catch {
    return undefined
  }
}

async function refusalOf(response: Response): Promise<ApiError> {
  const parsed = ErrorBody.safeParse(await readJson(response))
  if (parsed.success) {
    const { code, message, details } = parsed.data.error
    return new ApiError(code, message, details)
  }
  return new ApiError(
    'answer-unreadable',
    `The server answered with status ${response.status} and no reason.`,
  )
}

/**
 * Calls an endpoint and hands back the raw answer, for bytes.
 * @throws ApiError for a refusal, or `no-answer` where the network gave none.
 */
export async function callForResponse<
  P extends z.ZodObject,
  Q extends z.ZodObject,
  B extends z.ZodType,
  R extends z.ZodType,
>(endpoint: Endpoint<P, Q, B, R>, input: CallInput<P, Q, B>, options: CallOptions = {}): Promise<Response> {
  const loose: LooseInput = input
  let response: Response
  try {
    response = await fetch(addressOf(endpoint, loose), requestOf(endpoint.method, loose.body, options))
  } catch (cause) {
    if (options.signal?.aborted) throw cause
    throw new ApiError('no-answer', 'The server could not be reached.')
  }
  if (!response.ok) throw await refusalOf(response)
  return response
}

/**
 * Calls an endpoint; the answer has passed the contract's schema.
 * @throws ApiError for a refusal, no answer, or an answer that is not what the contract promises.
 */
export async function call<
  P extends z.ZodObject,
  Q extends z.ZodObject,
  B extends z.ZodType,
  R extends z.ZodType,
>(
  endpoint: Endpoint<P, Q, B, R>,
  input: CallInput<P, Q, B>,
  options: CallOptions = {},
): Promise<z.output<R>> {
  const response = await callForResponse(endpoint, input, options)
  const parsed = endpoint.response.safeParse(await readJson(response))
  if (parsed.success) return parsed.data
  throw new ApiError('answer-unreadable', 'The server’s answer is not in the form this page expects.')
}
