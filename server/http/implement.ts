import type { Request, RequestHandler, Response } from 'express'
import type { Logger } from 'pino'
import type { BodyOf, Endpoint, ParamsOf, QueryOf, ResponseOf } from '../../shared/contracts/endpoint.ts'
import type { Deps } from '../deps.ts'
import { authorise } from './authorise.ts'
import type { Caller } from './caller.ts'
import { answerOnce } from './idempotency.ts'
import { refuseWhileReadingOnly } from './reads-only.ts'
import { parse } from './validate.ts'

/** Returned by a handler that wrote the answer to `res` itself (bytes, a stream). */
export const handled = Symbol('handled')

interface PublicCall<E extends Endpoint> {
  deps: Deps
  params: ParamsOf<E>
  query: QueryOf<E>
  body: BodyOf<E>
  req: Request
  res: Response
  log: Logger
}
/** One call of an endpoint, with the parsed values and who calls. */
export interface Call<E extends Endpoint> extends PublicCall<E> {
  ctx: Caller
}

type Handler<E extends Endpoint, C> = (call: C) => Promise<ResponseOf<E> | typeof handled>

/** An endpoint with what answers it; `createApp` mounts these. */
export interface Route {
  endpoint: Endpoint
  handler: (deps: Deps) => RequestHandler
}

/** Answers an endpoint that only members of a club may call, as its `access` says. */
export function implement<E extends Endpoint>(endpoint: E, handler: Handler<E, Call<E>>): Route {
  if (endpoint.access === 'public') throw new Error(`${endpoint.path} is public: use implementPublic`)
  return {
    endpoint,
    handler: (deps) => async (req, res) => {
      const ctx = authorise(endpoint.access, req.user)
      refuseWhileReadingOnly(endpoint, ctx, deps.clock())
      const call = { ...readCall(endpoint, deps, req, res), ctx }
      const run = async () => conform(endpoint, await handler(call))
      const repeatable = endpoint.method === 'GET' || endpoint.repeat === 'natural'
      answer(res, repeatable ? await run() : await answerOnce(endpoint, call, run))
    },
  }
}

/** Answers an endpoint that anybody may call. */
export function implementPublic<E extends Endpoint>(endpoint: E, handler: Handler<E, PublicCall<E>>): Route {
  if (endpoint.access !== 'public') throw new Error(`${endpoint.path} is not public: use implement`)
  return {
    endpoint,
    handler: (deps) => async (req, res) =>
      answer(res, conform(endpoint, await handler(readCall(endpoint, deps, req, res)))),
  }
}

function readCall<E extends Endpoint>(endpoint: E, deps: Deps, req: Request, res: Response): PublicCall<E> {
  return {
    deps,
    params: parse(endpoint.params, req.params) as ParamsOf<E>,
    query: parse(endpoint.query, req.query) as QueryOf<E>,
    body: parse(endpoint.body, req.body ?? null) as BodyOf<E>,
    req,
    res,
    log: req.log,
  }
}

/** Holds an answer to its contract: a key that is not in it never leaves the server. */
function conform(endpoint: Endpoint, result: unknown): unknown {
  return result === handled ? handled : endpoint.response.parse(result)
}

function answer(res: Response, result: unknown): void {
  if (result === handled) return
  if (result === null) res.status(204).end()
  else res.json(result)
}
