import { and, eq, sql } from 'drizzle-orm'
import type { Tx } from '../../db/database.ts'
import { billingNotices, standings, subscriptions } from '../../db/schema/billing.ts'
import { clubs, memberships, people } from '../../db/schema/identity.ts'
import { paymentCustomers, paymentEvents } from '../../db/schema/payments.ts'
import { settings } from '../../db/schema/people-of-club.ts'
import type { CustomerTruth, PaymentEvent } from '../../integrations/payments/payments.ts'
import { readTruth } from './truth.ts'

/** In the role of identity. */
export async function findCustomer(tx: Tx, clubId: string): Promise<string | null> {
  const [found] = await tx
    .select({ id: paymentCustomers.customerId })
    .from(paymentCustomers)
    .where(eq(paymentCustomers.clubId, clubId))
  return found?.id ?? null
}

/** In the role of identity. */
export async function findClubOfCustomer(tx: Tx, customerId: string): Promise<string | null> {
  const [found] = await tx
    .select({ clubId: paymentCustomers.clubId })
    .from(paymentCustomers)
    .where(eq(paymentCustomers.customerId, customerId))
  return found?.clubId ?? null
}

/** In the role of identity. Of two at once the first stays. */
export async function insertCustomer(tx: Tx, clubId: string, customerId: string): Promise<void> {
  await tx.insert(paymentCustomers).values({ clubId, customerId }).onConflictDoNothing()
}

/** In the role of identity. False where the event was stored before. */
export async function insertEvent(
  tx: Tx,
  { id, type, customerId, createdAt }: PaymentEvent,
  { body, receivedAt }: { body: string; receivedAt: Date },
): Promise<boolean> {
  const stored = await tx
    .insert(paymentEvents)
    .values({ id, type, customerId, happenedAt: new Date(createdAt), receivedAt, body })
    .onConflictDoNothing()
    .returning({ id: paymentEvents.id })
  return stored.length > 0
}

/** In the role of identity. */
export async function selectClubIds(tx: Tx): Promise<string[]> {
  return (await tx.select({ id: clubs.id }).from(clubs)).map(({ id }) => id)
}

export interface Copy {
  truth: CustomerTruth | null
  trialEndsAt: Date | null
  syncedAt: Date | null
  /** 0 where there is no row yet. */
  version: number
}

export async function findCopy(tx: Tx, clubId: string): Promise<Copy> {
  const [row] = await tx.select().from(subscriptions).where(eq(subscriptions.clubId, clubId))
  if (!row) return { truth: null, trialEndsAt: null, syncedAt: null, version: 0 }
  const { truth, trialEndsAt, syncedAt, version } = row
  return { truth: readTruth(truth ?? null), trialEndsAt, syncedAt, version }
}

/** Keeps a newer copy; false where another was written since `version` was read. */
export async function putCopy(
  tx: Tx,
  clubId: string,
  version: number,
  { truth, syncedAt }: { truth: CustomerTruth; syncedAt: Date },
): Promise<boolean> {
  const written =
    version === 0
      ? await tx.insert(subscriptions).values({ clubId, truth, syncedAt }).onConflictDoNothing().returning()
      : await tx
          .update(subscriptions)
          .set({ truth, syncedAt, version: version + 1 })
          .where(and(eq(subscriptions.clubId, clubId), eq(subscriptions.version, version)))
          .returning()
  return written.length > 0
}

/** The copy stands as it is; false where another was written since `version` was read. */
export async function markSynced(tx: Tx, clubId: string, version: number, syncedAt: Date): Promise<boolean> {
  const marked = await tx
    .update(subscriptions)
    .set({ syncedAt })
    .where(and(eq(subscriptions.clubId, clubId), eq(subscriptions.version, version)))
    .returning({ version: subscriptions.version })
  return marked.length > 0
}

export async function insertTrial(tx: Tx, clubId: string, trialEndsAt: Date): Promise<void> {
  await tx.insert(subscriptions).values({ clubId, trialEndsAt })
}

export async function putStanding(tx: Tx, clubId: string, readsOnlyFrom: Date | null): Promise<void> {
  await tx
    .insert(standings)
    .values({ clubId, readsOnlyFrom })
    .onConflictDoUpdate({ target: standings.clubId, set: { readsOnlyFrom } })
}

export async function setPaidSeats(tx: Tx, clubId: string, seats: number): Promise<void> {
  await tx.update(settings).set({ seats }).where(eq(settings.clubId, clubId))
}

/** True where nobody was told yet. */
export async function noteNotice(tx: Tx, clubId: string, key: string): Promise<boolean> {
  const noted = await tx.insert(billingNotices).values({ clubId, key }).onConflictDoNothing().returning()
  return noted.length > 0
}

export async function selectAdminAddresses(tx: Tx, clubId: string): Promise<string[]> {
  const rows = await tx
    .select({ email: people.email })
    .from(memberships)
    .innerJoin(people, eq(people.id, memberships.personId))
    .where(and(eq(memberships.clubId, clubId), memberships.active, sql`'admin' = any(${memberships.roles})`))
    .orderBy(people.email)
  return rows.map(({ email }) => email)
}

/** Who buys, and for which club. */
export async function findBuyer(tx: Tx, clubId: string, personId: string) {
  const [buyer] = await tx
    .select({ name: clubs.name, email: people.email })
    .from(clubs)
    .innerJoin(people, eq(people.id, personId))
    .where(eq(clubs.id, clubId))
  if (!buyer) throw new Error('the buyer is not of the club')
  return buyer
}
