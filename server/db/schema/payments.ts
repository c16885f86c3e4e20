import { sql } from 'drizzle-orm'
import { date, pgPolicy, primaryKey, text, uniqueIndex, uuid } from 'drizzle-orm/pg-core'
import { createdAt, identity, identityRole, moment } from './base.ts'
import { clubs } from './identity.ts'

const identityPolicy = (table: string) =>
  pgPolicy(`${table}_identity`, { for: 'all', to: [identityRole], using: sql`true`, withCheck: sql`true` })

/** Which customer of the payment service a club is; made with its first checkout, and for good. */
export const paymentCustomers = identity.table(
  'payment_customers',
  {
    clubId: uuid('club_id')
      .primaryKey()
      .references(() => clubs.id),
    customerId: text('customer_id').notNull(),
    createdAt: createdAt(),
  },
  (t) => [uniqueIndex('payment_customers_customer').on(t.customerId), identityPolicy('payment_customers')],
)

/** Every event that the payment service sent, once. What it says is never used: the state is fetched anew. */
export const paymentEvents = identity.table(
  'payment_events',
  {
    /** The service's own. */
    id: text('id').primaryKey(),
    type: text('type').notNull(),
    customerId: text('customer_id'),
    /** By the service's clock. */
    happenedAt: moment('happened_at').notNull(),
    receivedAt: moment('received_at').notNull(),
    /** As it was signed, for a later question. */
    body: text('body').notNull(),
  },
  () => [identityPolicy('payment_events')],
)

/** Nights on which a nightly job was sent, so that of many workers one sends it. */
export const nightlyRuns = identity.table(
  'nightly_runs',
  { queue: text('queue').notNull(), night: date('night').notNull() },
  (t) => [primaryKey({ columns: [t.queue, t.night] }), identityPolicy('nightly_runs')],
)
