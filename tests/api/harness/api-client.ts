import { randomUUID } from 'node:crypto'
import type { IncomingMessage } from 'node:http'
import request, { type Response, type Test } from 'supertest'
import { signIn } from '../../../shared/contracts/account.ts'
import type { Endpoint, ResponseOf } from '../../../shared/contracts/endpoint.ts'
import { builtPassword } from '../../../seed/builders/person.ts'

export interface CallOptions {
  params?: Record<string, string | number>
  query?: Record<string, string | number>
  body?: unknown
  /** Of the Idempotency-Key; a fresh one unless given, none where null. */
  key?: string | null
  headers?: Record<string, string>
  /** Sent as multipart/form-data, as the part `chunk`. */
  part?: Buffer
}

/** A browser as far as the API is concerned: it keeps its cookie and calls endpoints by their contract. */
export class ApiClient {
  readonly agent: ReturnType<typeof request.agent>
  readonly #log: readonly string[]

  /** `log`: the server's lines, told with an answer that nobody expected. */
  constructor(url: string, log: readonly string[]) {
    this.agent = request.agent(url)
    this.#log = log
  }

  /** Sends a request, whatever the answer will be. */
  send(endpoint: Endpoint, { params = {}, query, body, key, headers = {}, part }: CallOptions = {}): Test {
    const path = endpoint.path.replace(/:(\w+)/g, (_, name: string) =>
      encodeURIComponent(String(params[name] ?? '')),
    )
    const method = endpoint.method.toLowerCase() as 'get' | 'post' | 'patch' | 'put' | 'delete'
    const test = this.agent[method](path).set(headers)
    if (query) test.query(query)
    const keyed = endpoint.method !== 'GET' && endpoint.repeat === 'key'
    if (keyed && key !== null) test.set('Idempotency-Key', key ?? randomUUID())
    if (body !== undefined) test.send(body as object)
    if (part) test.attach('chunk', part, 'blob')
    return test
  }

  /** The parsed answer of a request that succeeds; throws with the answer where it does not. */
  async call<E extends Endpoint>(endpoint: E, options: CallOptions = {}): Promise<ResponseOf<E>> {
    const response = await this.send(endpoint, options)
    if (response.status === 200) return endpoint.response.parse(response.body) as ResponseOf<E>
    if (response.status === 204) return endpoint.response.parse(null) as ResponseOf<E>
    throw new Error(
      `${endpoint.method} ${endpoint.path}: ${response.status} ${response.text}${this.#lastFault()}`,
    )
  }

  #lastFault(): string {
    const fault = this.#log.findLast((line) => line.includes('"level":50'))
    return fault ? `\nlast fault in the log: ${fault}` : ''
  }

  /** Status and error code of a request that is refused. */
  async refusal(endpoint: Endpoint, options: CallOptions = {}): Promise<[number, string]> {
    return refusalOf(await this.send(endpoint, options))
  }

  /** Status, error code and text of an answer, of a stream only its beginning. */
  async glance(
    endpoint: Endpoint,
    options: CallOptions = {},
  ): Promise<{ status: number; code: string; text: string }> {
    const response = await this.send(endpoint, options)
      .buffer(true)
      .parse((stream, done) => {
        const { headers } = stream as unknown as IncomingMessage
        let text = ''
        const finish = () => done(null, text)
        stream.on('data', (data: Buffer) => (text += data.toString('latin1')))
        stream.on('end', finish)
        if (!headers['content-type']?.startsWith('text/event-stream')) return
        finish()
        stream.on('error', () => undefined)
        ;(stream as unknown as IncomingMessage).destroy()
      })
    const text = String(response.body)
    return { status: response.status, code: /"code":"([\w-]+)"/.exec(text)?.[1] ?? '', text }
  }

  async signIn(email: string, password = builtPassword): Promise<void> {
    await this.call(signIn, { body: { email, password } })
  }
}

export const refusalOf = (response: Response): [number, string] => [
  response.status,
  (response.body as { error?: { code?: string } }).error?.code ?? '',
]
