import { isDeepStrictEqual } from 'node:util'
import { workerContext, type Tx } from '../../db/database.ts'
import type { Deps } from '../../deps.ts'
import type { CustomerTruth } from '../../integrations/payments/payments.ts'
import { paymentsOf } from '../../integrations/payments/payments-of.ts'
import { sendMail } from '../mail/mail.service.ts'
import { fillSeats } from '../seats/seats.service.ts'
import {
  findCopy,
  findCustomer,
  markSynced,
  noteNotice,
  putCopy,
  putStanding,
  selectAdminAddresses,
  setPaidSeats,
  type Copy,
} from './billing.queries.ts'
import { keepNewest } from './keep-newest.ts'
import { noticesDue } from './notices.ts'
import { standingOf } from './standing.ts'

type SyncDeps = Pick<Deps, 'config' | 'db' | 'clock'>

/**
 * Fetches a club's state from the payment service and keeps it. Events come twice and in any order, so none of
 * them is believed: whatever happened, the state is read anew.
 */
export async function syncClub({ config, db, clock }: SyncDeps, clubId: string): Promise<void> {
  const ctx = workerContext(clubId)
  const customerId = await db.inIdentity((tx) => findCustomer(tx, clubId))
  const payments = paymentsOf(config)
  await keepNewest<Copy, CustomerTruth | null>({
    read: () => db.inClub(ctx, (tx) => findCopy(tx, clubId)),
    fetch: async ({ truth }) => (customerId && payments ? payments.readCustomer(customerId) : truth),
    write: (before, truth) => db.inClub(ctx, (tx) => settle(tx, clubId, before, truth, clock())),
  })
}

/** Writes the copy, what it means for the club, and the mails that it makes necessary; false where it came too late. */
async function settle(
  tx: Tx,
  clubId: string,
  before: Copy,
  truth: CustomerTruth | null,
  now: Date,
): Promise<boolean> {
  if (truth && !(await keep(tx, clubId, before, truth, now))) return false
  const standing = standingOf(truth, before.trialEndsAt, now)
  if (truth || before.trialEndsAt) await putStanding(tx, clubId, standing.readsOnlyFrom)
  if (standing.seats !== null) await setPaidSeats(tx, clubId, standing.seats)
  await fillSeats(tx, clubId, now)
  for (const { key, template, payload } of noticesDue(truth, standing, now)) {
    if (!(await noteNotice(tx, clubId, key))) continue
    for (const to of await selectAdminAddresses(tx, clubId)) {
      await sendMail(tx, { clubId, to, template, payload })
    }
  }
  return true
}

const keep = (tx: Tx, clubId: string, { truth: kept, version }: Copy, truth: CustomerTruth, now: Date) =>
  isDeepStrictEqual(truth, kept)
    ? markSynced(tx, clubId, version, now)
    : putCopy(tx, clubId, version, { truth, syncedAt: now })
