import { z } from 'zod'
import type { Role } from './roles.ts'

/** Who may call: anybody; anybody signed in to the club; or whoever holds one of these roles in it. */
export type Access = 'public' | 'signed-in' | readonly Role[]

export interface Endpoint<
  P extends z.ZodObject = z.ZodObject,
  Q extends z.ZodObject = z.ZodObject,
  B extends z.ZodType = z.ZodType,
  R extends z.ZodType = z.ZodType,
> {
  method: 'GET' | 'POST' | 'PATCH' | 'PUT' | 'DELETE'
  /** Express pattern, e.g. `/api/sessions/:sessionId`. */
  path: string
  access: Access
  /** Unknown keys are refused in all three. */
  params: P
  query: Q
  body: B
  response: R
  /**
   * How a repeated mutation is told from a new one: by the caller's `Idempotency-Key` header (every mutation of
   * club data), or 'natural' where the act itself is safe to repeat (sign-in, reset, a chunk of an upload).
   */
  repeat: 'key' | 'natural'
  /** 'allowed' where a club may call it although its subscription has lapsed: reading always, and what this says. */
  whileReadingOnly?: 'allowed'
}

const nothing = z.strictObject({})
export const noContent = z.null()

/** One endpoint of the API, read by the server (route, authorisation, validation) and by the client (call, types). */
export function endpoint<
  R extends z.ZodType,
  P extends z.ZodObject = typeof nothing,
  Q extends z.ZodObject = typeof nothing,
  B extends z.ZodType = typeof noContent,
>(definition: {
  method: Endpoint['method']
  path: string
  access: Access
  params?: P
  query?: Q
  body?: B
  response: R
  repeat?: Endpoint['repeat']
  whileReadingOnly?: Endpoint['whileReadingOnly']
}): Endpoint<P, Q, B, R> {
  return {
    repeat: 'key',
    params: nothing as unknown as P,
    query: nothing as unknown as Q,
    body: noContent as unknown as B,
    ...definition,
  } as Endpoint<P, Q, B, R>
}

export type ParamsOf<E> = E extends Endpoint<infer P, z.ZodObject, z.ZodType, z.ZodType> ? z.output<P> : never
export type QueryOf<E> = E extends Endpoint<z.ZodObject, infer Q, z.ZodType, z.ZodType> ? z.output<Q> : never
export type BodyOf<E> = E extends Endpoint<z.ZodObject, z.ZodObject, infer B, z.ZodType> ? z.output<B> : never
export type ResponseOf<E> =
  E extends Endpoint<z.ZodObject, z.ZodObject, z.ZodType, infer R> ? z.output<R> : never
