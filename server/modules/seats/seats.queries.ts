import { and, asc, count, eq, gt, isNull, or, sql } from 'drizzle-orm'
import type { Tx } from '../../db/database.ts'
import { athletes, settings } from '../../db/schema/people-of-club.ts'
import { seatRules, seats, seatWaits } from '../../db/schema/seats.ts'
import { trials } from '../../db/schema/trials.ts'

/** Whoever gives or takes a seat of a club waits for who is doing so: two athletes never get one seat. */
export async function lockSeats(tx: Tx, clubId: string): Promise<void> {
  await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${`seats ${clubId}`}, 0))`)
}

/** Held, or released and not free yet. */
const taken = (clubId: string, now: Date) =>
  and(eq(seats.clubId, clubId), or(isNull(seats.releasedAt), gt(seats.freesAt, now)))

/** Taken seats, the longest held first: where fewer are paid for, these are the ones that count. */
export function selectTaken(tx: Tx, clubId: string, now: Date) {
  return tx
    .select({
      id: seats.id,
      athleteId: seats.athleteId,
      name: athletes.name,
      assignedAt: seats.assignedAt,
      releasedAt: seats.releasedAt,
      freesAt: seats.freesAt,
    })
    .from(seats)
    .innerJoin(athletes, and(eq(athletes.clubId, seats.clubId), eq(athletes.id, seats.athleteId)))
    .where(taken(clubId, now))
    .orderBy(asc(seats.assignedAt), asc(seats.id))
}

export async function countTaken(tx: Tx, clubId: string, now: Date): Promise<number> {
  const [row] = await tx.select({ n: count() }).from(seats).where(taken(clubId, now))
  return row?.n ?? 0
}

export async function findPaid(tx: Tx, clubId: string): Promise<number> {
  const [row] = await tx.select({ paid: settings.seats }).from(settings).where(eq(settings.clubId, clubId))
  return row?.paid ?? 0
}

/** The athlete's seat that is held, or that cools. */
export async function findSeatOf(tx: Tx, clubId: string, athleteId: string, now: Date) {
  const [seat] = await tx
    .select()
    .from(seats)
    .where(and(taken(clubId, now), eq(seats.athleteId, athleteId)))
    .orderBy(sql`${seats.releasedAt} is not null`)
    .limit(1)
  return seat ?? null
}

export async function insertSeat(tx: Tx, clubId: string, athleteId: string, assignedAt: Date): Promise<void> {
  await tx.insert(seats).values({ clubId, athleteId, assignedAt })
}

export async function setReleased(
  tx: Tx,
  clubId: string,
  seatId: string,
  released: { releasedAt: Date; freesAt: Date } | null,
): Promise<void> {
  await tx
    .update(seats)
    .set(released ?? { releasedAt: null, freesAt: null })
    .where(and(eq(seats.clubId, clubId), eq(seats.id, seatId)))
}

/** Whether anything was ever measured of the athlete. */
export async function hasTrials(tx: Tx, clubId: string, athleteId: string): Promise<boolean> {
  const found = await tx
    .select({ id: trials.id })
    .from(trials)
    .where(and(eq(trials.clubId, clubId), eq(trials.athleteId, athleteId)))
    .limit(1)
  return found.length > 0
}

export async function putWait(tx: Tx, clubId: string, athleteId: string, since: Date): Promise<void> {
  await tx.insert(seatWaits).values({ clubId, athleteId, since }).onConflictDoNothing()
}

export async function dropWait(tx: Tx, clubId: string, athleteId: string): Promise<void> {
  await tx.delete(seatWaits).where(and(eq(seatWaits.clubId, clubId), eq(seatWaits.athleteId, athleteId)))
}

export function selectWaits(tx: Tx, clubId: string) {
  return tx
    .select({ athleteId: seatWaits.athleteId, since: seatWaits.since })
    .from(seatWaits)
    .where(eq(seatWaits.clubId, clubId))
    .orderBy(asc(seatWaits.since), asc(seatWaits.athleteId))
}

export function selectActive(tx: Tx, clubId: string) {
  return tx
    .select({ id: athletes.id, name: athletes.name })
    .from(athletes)
    .where(and(eq(athletes.clubId, clubId), isNull(athletes.archivedAt)))
    .orderBy(asc(athletes.name), asc(athletes.id))
}

export async function findRule(tx: Tx, clubId: string): Promise<{ byItself: boolean; version: number }> {
  const [rule] = await tx
    .select({ byItself: seatRules.byItself, version: seatRules.version })
    .from(seatRules)
    .where(eq(seatRules.clubId, clubId))
  return rule ?? { byItself: true, version: 0 }
}

/** False where the version is not the row's (any more). */
export async function putRule(tx: Tx, clubId: string, byItself: boolean, version: number): Promise<boolean> {
  const written =
    version === 0
      ? await tx.insert(seatRules).values({ clubId, byItself }).onConflictDoNothing().returning()
      : await tx
          .update(seatRules)
          .set({ byItself, version: version + 1 })
          .where(and(eq(seatRules.clubId, clubId), eq(seatRules.version, version)))
          .returning()
  return written.length > 0
}
