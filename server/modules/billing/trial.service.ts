import { limits } from '../../../shared/contracts/limits.ts'
import type { Tx } from '../../db/database.ts'
import { insertTrial, putStanding } from './billing.queries.ts'

/** Begins the trial period of a new club, within the transaction that makes it; returns when it ends. */
export async function beginTrial(tx: Tx, clubId: string, now: Date): Promise<Date> {
  const endsAt = new Date(now.getTime() + limits.trialDays * 24 * 3600 * 1000)
  await insertTrial(tx, clubId, endsAt)
  await putStanding(tx, clubId, endsAt)
  return endsAt
}
