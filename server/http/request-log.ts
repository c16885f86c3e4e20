import { randomUUID } from 'node:crypto'
import type { RequestHandler } from 'express'
import type { IncomingMessage, ServerResponse } from 'node:http'
import type { Logger } from 'pino'
import { pinoHttp } from 'pino-http'
import { describeError, scrub } from '../integrations/log.ts'

interface LoggedRequest {
  id: string
  method: string
  url: string
  /** Express' own: `url` is cut on the way through routers. */
  originalUrl?: string
}

/** Gives every request an id (sent back as `X-Request-Id`) and one line in the log when it is answered. */
export function requestLog(logger: Logger): RequestHandler {
  return pinoHttp({
    logger,
    genReqId: (_req: IncomingMessage, res: ServerResponse) => {
      const id = randomUUID()
      res.setHeader('X-Request-Id', id)
      return id
    },
    // Bodies and query strings carry names and notes; headers carry the cookie: none of them is logged.
    serializers: {
      req: ({ id, method, url, originalUrl }: LoggedRequest) => ({
        id,
        method,
        path: scrub((originalUrl ?? url).split('?')[0] ?? ''),
      }),
      res: (res: { statusCode: number }) => ({ status: res.statusCode }),
      err: describeError,
    },
    customLogLevel: (_req, res, error) => (error || res.statusCode >= 500 ? 'error' : 'info'),
    wrapSerializers: false,
  })
}
