import type { IncomingMessage, ServerResponse } from 'node:http'
import { answerCall } from './answer-call.ts'
import { takeFault } from './faults.ts'
import { answerPage } from './pages/answer-page.ts'
import type { PaymentService } from './payment-service.ts'

/** Calls of the SDK under `/v1`, pages for a person everywhere else. */
export async function answerRequest(
  service: PaymentService,
  req: IncomingMessage,
  res: ServerResponse,
): Promise<void> {
  const { pathname, search } = new URL(req.url ?? '/', service.url)
  const body = await readText(req)
  const method = req.method ?? 'GET'
  if (!pathname.startsWith('/v1/')) return answerPage(service, { method, path: pathname, form: body }, res)
  const fault = takeFault(service.faults, `${method} ${pathname}`)
  if (fault?.kind === 'error') {
    return answerJson(res, 500, { error: { type: 'api_error', message: 'An unknown error occurred.' } })
  }
  const answer = answerCall(service.books, {
    method,
    path: pathname,
    form: method === 'GET' ? search.slice(1) : body,
    secretKey: /^Bearer (.+)$/u.exec(req.headers.authorization ?? '')?.[1],
    idempotencyKey: req.headers['idempotency-key']?.toString(),
  })
  service.save()
  if (fault?.kind !== 'time-out') answerJson(res, answer.status, answer.body, answer.replayed)
  void service.delivery.send()
}

function answerJson(res: ServerResponse, status: number, body: unknown, replayed = false): void {
  res.writeHead(status, {
    'content-type': 'application/json',
    'request-id': 'req_local',
    ...(replayed && { 'idempotent-replayed': 'true' }),
  })
  res.end(JSON.stringify(body))
}

async function readText(req: IncomingMessage): Promise<string> {
  const parts: Buffer[] = []
  for await (const part of req) parts.push(part as Buffer)
  return Buffer.concat(parts).toString('utf8')
}
