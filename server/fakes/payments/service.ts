import { once } from 'node:events'
import { createServer, type Server } from 'node:http'
import type { AddressInfo } from 'node:net'
import type { Books } from './books.ts'
import { stockCatalogue } from './catalogue.ts'
import { runDue } from './clock.ts'
import { createDelivery } from './delivery.ts'
import type { PaymentService } from './payment-service.ts'
import { answerRequest } from './requests.ts'
import { openState } from './state.ts'

export interface PaymentServiceOptions {
  /** 0 picks a free one. */
  port: number
  /** Where its state is kept; nowhere but in memory without it. */
  file?: string
  /** Where events are delivered to, and what signs them. */
  webhookUrl?: string
  webhookSecret: string
  /** Seconds since 1970 where the clock does not run by itself. */
  startsAtS?: number
  /** Seconds since 1970 by the clock of whoever checks signatures. */
  signedAtS?: () => number
}

const loopback = '127.0.0.1'
const dayS = 24 * 3600
/** How often due renewals are looked for, and undelivered events sent again. */
const tickMs = 2000

/** A payment service on loopback that the SDK speaks to as to the hosted one. For development and tests only. */
export async function startPaymentService(options: PaymentServiceOptions): Promise<PaymentService> {
  const { state, save } = openState(options.file)
  const wallS = () => options.startsAtS ?? Math.floor(Date.now() / 1000)
  let fixedS: number | null = null
  const server = createServer()
  const books: Books = {
    state,
    now: () => fixedS ?? wallS() + state.aheadS,
    id: (prefix) => `${prefix}_${String(++state.counter).padStart(6, '0')}`,
    baseUrl: () => service.url,
  }
  const runClock = () => {
    runDue(books, (s) => (fixedS = s))
    fixedS = null
    save()
  }
  const service: PaymentService = {
    url: '',
    books,
    faults: [],
    webhookUrl: options.webhookUrl,
    delivery: createDelivery({
      state,
      save,
      url: () => service.webhookUrl,
      secret: options.webhookSecret,
      signedAtS: options.signedAtS ?? (() => Math.floor(Date.now() / 1000)),
    }),
    async advance(days) {
      state.aheadS += days * dayS
      runClock()
      await service.delivery.send()
    },
    save,
    async stop() {
      clearInterval(tick)
      await closeServer(server)
    },
  }
  const tick = setInterval(() => {
    if (options.startsAtS !== undefined) return
    runClock()
    void service.delivery.send()
  }, tickMs).unref()
  server.on('request', (req, res) => void answerRequest(service, req, res))
  server.listen(options.port, loopback)
  await once(server, 'listening')
  service.url = `http://${loopback}:${(server.address() as AddressInfo).port}`
  stockCatalogue(books)
  save()
  return service
}

async function closeServer(server: Server): Promise<void> {
  const closed = once(server, 'close')
  server.close()
  server.closeAllConnections()
  await closed
}
