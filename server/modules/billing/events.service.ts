import { sql } from 'drizzle-orm'
import type { Deps } from '../../deps.ts'
import { sendJobs } from '../../jobs/queue.ts'
import { findClubOfCustomer, insertEvent } from './billing.queries.ts'
import { requirePayments } from './billing.service.ts'

/**
 * Takes a signed event: stores it once, and has the state of the club that it is about fetched anew. An event about
 * nobody that we know is stored, logged and answered like any other, so that the service does not send it again.
 */
export async function takeEvent(
  deps: Pick<Deps, 'config' | 'db' | 'clock' | 'log'>,
  raw: Uint8Array,
  signature: string,
): Promise<void> {
  const { db, clock, log } = deps
  const event = requirePayments(deps).readEvent(raw, signature, clock())
  const received = { body: Buffer.from(raw).toString('utf8'), receivedAt: clock() }
  await db.inIdentity(async (tx) => {
    if (!(await insertEvent(tx, event, received))) return
    const clubId = event.customerId && (await findClubOfCustomer(tx, event.customerId))
    if (!clubId) {
      log.warn({ event: event.id, type: event.type }, 'a payment event about no customer of ours')
      return
    }
    // The queue is not the identity role's.
    await tx.execute(sql`set local role none`)
    await sendJobs(tx, 'sync-billing', { version: 1, clubId })
  })
}
