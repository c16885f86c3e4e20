import { sql } from 'drizzle-orm'
import type { Deps } from '../deps.ts'
import { nightlyRuns } from '../db/schema/payments.ts'
import { sendJobs } from './queue.ts'

/** When the night's jobs are sent, UTC: few clubs test at this hour. */
const nightHour = 2
const lookEveryMs = 10 * 60 * 1000

/** Queues whose job is sent once a night. */
const nightlyQueues = ['reconcile-billing'] as const

/** Sends the night's jobs, once each, whichever worker is the first to look; a worker that was away makes up for it. */
export async function sendNightly({ db, clock }: Pick<Deps, 'db' | 'clock'>): Promise<void> {
  const night = new Date(clock().getTime() - nightHour * 3600 * 1000).toISOString().slice(0, 10)
  for (const queue of nightlyQueues) {
    await db.inIdentity(async (tx) => {
      const first = await tx.insert(nightlyRuns).values({ queue, night }).onConflictDoNothing().returning()
      if (first.length === 0) return
      await tx.execute(sql`set local role none`)
      await sendJobs(tx, queue, { version: 1 })
    })
  }
}

/** Looks now and every ten minutes; returns what stops it. */
export function watchNights(deps: Pick<Deps, 'db' | 'clock' | 'log'>): () => void {
  const look = () =>
    void sendNightly(deps).catch((error: unknown) =>
      deps.log.error({ err: error }, 'nightly jobs were not sent'),
    )
  look()
  const timer = setInterval(look, lookEveryMs)
  return () => clearInterval(timer)
}
