import { sql } from 'drizzle-orm'
import { integer, jsonb, pgPolicy, primaryKey, text } from 'drizzle-orm/pg-core'
import {
  club,
  clubId,
  createdAt,
  currentPerson,
  isAdmin,
  moment,
  ownClubPolicy,
  staffOrPolicy,
  webRole,
  workerRole,
} from './base.ts'
import { clubs } from './identity.ts'

/** Rows that admins and the worker see, and nobody else of the club. */
const adminPolicy = (table: string) => {
  const adminOrWorker = sql`${isAdmin} or ${currentPerson} is null`
  return pgPolicy(`${table}_admin`, {
    as: 'restrictive',
    for: 'all',
    to: [webRole, workerRole],
    using: adminOrWorker,
    withCheck: adminOrWorker,
  })
}

/** Until when a club may write; read with every request of anybody of the club. No row: for ever. */
export const standings = club.table(
  'standings',
  {
    clubId: clubId()
      .primaryKey()
      .references(() => clubs.id),
    readsOnlyFrom: moment('reads_only_from'),
  },
  () => [ownClubPolicy('standings'), staffOrPolicy('standings', sql`true`)],
)

/** A copy of what the payment service said last, and the trial period. */
export const subscriptions = club.table(
  'subscriptions',
  {
    clubId: clubId()
      .primaryKey()
      .references(() => clubs.id),
    /** Of server/integrations/payments: CustomerTruth; null before the first purchase. */
    truth: jsonb('truth').$type<unknown>(),
    trialEndsAt: moment('trial_ends_at'),
    syncedAt: moment('synced_at'),
    /** Counts the changes of the copy: whoever writes an older state over a newer one is refused. */
    version: integer('version').notNull().default(1),
  },
  () => [ownClubPolicy('subscriptions'), adminPolicy('subscriptions')],
)

/** What was mailed to the admins about money, so that nothing is mailed twice. */
export const billingNotices = club.table(
  'billing_notices',
  {
    clubId: clubId().references(() => clubs.id),
    /** Kind and subject, as `receipt:in_…`. */
    key: text('key').notNull(),
    createdAt: createdAt(),
  },
  (t) => [
    primaryKey({ columns: [t.clubId, t.key] }),
    ownClubPolicy('billing_notices'),
    adminPolicy('billing_notices'),
  ],
)
