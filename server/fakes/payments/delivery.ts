import { createHmac } from 'node:crypto'
import type { ServiceEvent } from './shapes.ts'
import type { PaymentState } from './state.ts'

/** `t=…,v1=…`, as the hosted service signs: HMAC-SHA-256 of the moment, a dot and the body. */
export function sign(body: string, secret: string, atS: number): string {
  const signature = createHmac('sha256', secret).update(`${atS}.${body}`).digest('hex')
  return `t=${atS},v1=${signature}`
}

export interface Delivery {
  /** Sends what is undelivered; what the other side does not take stays for the next time. */
  send(): Promise<void>
  /** While true nothing is sent. */
  hold: boolean
  /** The next ones go out in the opposite order, or twice. */
  reversed: boolean
  twice: boolean
}

interface Options {
  state: PaymentState
  save: () => void
  url: () => string | undefined
  secret: string
  /** Seconds since 1970 by the clock of whoever checks the signature. */
  signedAtS: () => number
}

const patienceMs = 5000

export function createDelivery({ state, save, url, secret, signedAtS }: Options): Delivery {
  let running: Promise<void> = Promise.resolve()
  const delivery: Delivery = {
    hold: false,
    reversed: false,
    twice: false,
    send() {
      running = running.then(sendAll)
      return running
    },
  }
  return delivery

  async function sendAll(): Promise<void> {
    const target = url()
    if (delivery.hold || !target) return
    const events = state.undelivered.splice(0)
    if (delivery.reversed) events.reverse()
    const late: ServiceEvent[] = []
    for (const event of events) {
      const body = JSON.stringify(event)
      if (!(await post(target, body))) late.push(event)
      else if (delivery.twice) await post(target, body)
    }
    state.undelivered.unshift(...late)
    save()
  }

  async function post(target: string, body: string): Promise<boolean> {
    const headers = {
      'content-type': 'application/json; charset=utf-8',
      'stripe-signature': sign(body, secret, signedAtS()),
    }
    const signal = AbortSignal.timeout(patienceMs)
    const answer = await fetch(target, { method: 'POST', headers, body, signal }).catch(() => null)
    return answer?.ok ?? false
  }
}
