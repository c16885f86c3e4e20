import type { PaymentService } from '../../../server/fakes/payments/payment-service.ts'
import { startPaymentService } from '../../../server/fakes/payments/service.ts'
import { allJobs } from '../../../server/jobs/all-jobs.ts'
import type { JobDeps } from '../../../server/jobs/define-job.ts'
import { startHarness, type Harness } from './harness.ts'

const webhookSecret = 'whsec_of_the_tests'
const startsAt = new Date('2027-03-01T10:00:00Z')

export interface PayingHarness extends Harness {
  payments: PaymentService
  webhookSecret: string
  /** Moves the service's clock and the product's on together, and works off what came of it. */
  advance(days: number): Promise<void>
  /** Does what the worker would: the billing jobs that events have sent, to their end. */
  workOff(): Promise<void>
}

/** The web application with the local payment service beside it, both by one clock. */
export async function startPayingHarness(environment: Record<string, string> = {}): Promise<PayingHarness> {
  let signedAt = () => startsAt
  const payments = await startPaymentService({
    port: 0,
    webhookSecret,
    startsAtS: startsAt.getTime() / 1000,
    signedAtS: () => Math.floor(signedAt().getTime() / 1000),
  })
  const started = await startHarness({
    STRIPE_SECRET_KEY: 'sk_test_of_the_tests',
    STRIPE_WEBHOOK_SECRET: webhookSecret,
    PAYMENT_SERVICE_URL: payments.url,
    ...environment,
  })
  started.time.now = new Date(startsAt)
  signedAt = () => started.time.now
  payments.webhookUrl = `${started.url}/api/payments/events`
  const harness: PayingHarness = {
    ...started,
    payments,
    webhookSecret,
    async advance(days) {
      started.time.now = new Date(started.time.now.getTime() + days * 24 * 3600 * 1000)
      await payments.advance(days)
      await harness.workOff()
    },
    async workOff() {
      await payments.delivery.send()
      await workOffJobs(started)
    },
    async stop() {
      await payments.stop()
      await started.stop()
    },
  }
  return harness
}

/** Takes the waiting billing jobs out of the queue, oldest first, and does them. */
async function workOffJobs({ workerDeps }: Harness): Promise<void> {
  const jobs = new Map(allJobs.map((job) => [job.queue as string, job]))
  for (;;) {
    const { rows } = await workerDeps.db.pool.query<{ id: string; name: string; data: unknown }>(
      `update pgboss.job set state = 'completed', completed_on = now() where id = (
         select id from pgboss.job where state = 'created' and name in ('sync-billing', 'reconcile-billing')
         order by created_on limit 1) returning id, name, data`,
    )
    const [next] = rows
    if (!next) return
    await jobs.get(next.name)?.handle(workerDeps as JobDeps, next.data)
  }
}
