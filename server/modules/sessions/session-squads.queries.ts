import { and, asc, count, eq, inArray, isNull, notExists, notInArray, sql } from 'drizzle-orm'
import type { Tx } from '../../db/database.ts'
import { athletes, squadMembers, squads } from '../../db/schema/people-of-club.ts'
import { sessionAthletes, sessionSquads } from '../../db/schema/sessions.ts'
import { trials } from '../../db/schema/trials.ts'

const ofSession = (clubId: string, sessionId: string) =>
  and(eq(sessionSquads.clubId, clubId), eq(sessionSquads.sessionId, sessionId))

/**
 * Until the transaction ends, whoever reads the session's test and athletes to make or assign a trial (`share`) and
 * whoever changes its test or squads (`alone`) wait for each other: no trial ends up on an athlete who is off the
 * sheet, or with a test that the session had a moment ago.
 */
export async function lockSession(
  tx: Tx,
  clubId: string,
  sessionId: string,
  how: 'share' | 'alone',
): Promise<void> {
  const key = sql`hashtextextended(${`session/${clubId}/${sessionId}`}, 0)`
  await tx.execute(
    how === 'alone'
      ? sql`select pg_advisory_xact_lock(${key})`
      : sql`select pg_advisory_xact_lock_shared(${key})`,
  )
}

/** How many of these squads the club has and has not archived. */
export async function countSquads(tx: Tx, clubId: string, squadIds: string[]): Promise<number> {
  const [{ n }] = await tx
    .select({ n: count() })
    .from(squads)
    .where(and(eq(squads.clubId, clubId), inArray(squads.id, squadIds), isNull(squads.archivedAt)))
  return n
}

export async function squadIdsOfSession(tx: Tx, clubId: string, sessionId: string): Promise<string[]> {
  const rows = await tx
    .select({ id: sessionSquads.squadId })
    .from(sessionSquads)
    .where(ofSession(clubId, sessionId))
    .orderBy(asc(sessionSquads.squadId))
  return rows.map(({ id }) => id)
}

/** Adds squads, with the athletes that they have today. */
export async function addSquads(
  tx: Tx,
  clubId: string,
  sessionId: string,
  squadIds: string[],
): Promise<void> {
  if (squadIds.length === 0) return
  await tx.insert(sessionSquads).values(squadIds.map((squadId) => ({ clubId, sessionId, squadId })))
  const members = await tx
    .selectDistinct({ athleteId: athletes.id })
    .from(squadMembers)
    .innerJoin(
      athletes,
      and(eq(athletes.clubId, squadMembers.clubId), eq(athletes.id, squadMembers.athleteId)),
    )
    .where(and(isMember(clubId, squadIds), isNull(athletes.archivedAt)))
  if (members.length === 0) return
  const lines = members.map(({ athleteId }) => ({ clubId, sessionId, athleteId }))
  await tx.insert(sessionAthletes).values(lines).onConflictDoNothing()
}

/** Takes squads out, with their athletes who are in no other squad of the session and have no trial in it. */
export async function removeSquads(
  tx: Tx,
  clubId: string,
  sessionId: string,
  squadIds: string[],
): Promise<void> {
  if (squadIds.length === 0) return
  await tx
    .delete(sessionSquads)
    .where(and(ofSession(clubId, sessionId), inArray(sessionSquads.squadId, squadIds)))
  const left = await squadIdsOfSession(tx, clubId, sessionId)
  const members = (ids: string[]) =>
    tx.select({ id: squadMembers.athleteId }).from(squadMembers).where(isMember(clubId, ids))
  const theirTrials = tx
    .select({ one: sql`1` })
    .from(trials)
    .where(
      and(
        eq(trials.clubId, clubId),
        eq(trials.sessionId, sessionId),
        eq(trials.athleteId, sessionAthletes.athleteId),
      ),
    )
  await tx
    .delete(sessionAthletes)
    .where(
      and(
        eq(sessionAthletes.clubId, clubId),
        eq(sessionAthletes.sessionId, sessionId),
        inArray(sessionAthletes.athleteId, members(squadIds)),
        notInArray(sessionAthletes.athleteId, members(left)),
        notExists(theirTrials),
      ),
    )
}

const isMember = (clubId: string, squadIds: string[]) =>
  and(eq(squadMembers.clubId, clubId), inArray(squadMembers.squadId, squadIds))

/** The athletes of a session by name. */
export function athletesOfSession(tx: Tx, clubId: string, sessionId: string) {
  return tx
    .select({ id: athletes.id, name: athletes.name, nameKey: athletes.nameKey })
    .from(sessionAthletes)
    .innerJoin(
      athletes,
      and(eq(athletes.clubId, sessionAthletes.clubId), eq(athletes.id, sessionAthletes.athleteId)),
    )
    .where(and(eq(sessionAthletes.clubId, clubId), eq(sessionAthletes.sessionId, sessionId)))
    .orderBy(asc(athletes.nameKey), asc(athletes.id))
}
