import { sql } from 'drizzle-orm'
import { defineJob } from '../../jobs/define-job.ts'
import { sendJobs } from '../../jobs/queue.ts'
import { selectClubIds } from './billing.queries.ts'
import { syncClub } from './sync.service.ts'

export const syncBillingJob = defineJob('sync-billing', (deps, { clubId }) => syncClub(deps, clubId))

/** Every night all clubs are read anew: an event that never came, and the days on which somebody is reminded. */
export const reconcileBillingJob = defineJob('reconcile-billing', ({ db }) =>
  db.inIdentity(async (tx) => {
    const clubIds = await selectClubIds(tx)
    await tx.execute(sql`set local role none`)
    await sendJobs(tx, 'sync-billing', ...clubIds.map((clubId) => ({ version: 1 as const, clubId })))
  }),
)
