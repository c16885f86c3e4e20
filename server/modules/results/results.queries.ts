import { and, asc, eq, inArray, isNotNull, isNull, type SQL, sql } from 'drizzle-orm'
import type { PgColumn } from 'drizzle-orm/pg-core'
import type { Test } from '../../../shared/contracts/tests.ts'
import type { Tx } from '../../db/database.ts'
import { athletes } from '../../db/schema/people-of-club.ts'
import { sessionResults, trialSpreads } from '../../db/schema/results.ts'
import { sessions } from '../../db/schema/sessions.ts'
import { analyses, publishedTrials, trials } from '../../db/schema/trials.ts'
import type { GatheredResult } from './gather-results.ts'

/** 'working' follows the sheet; 'published' holds what the newest publication pinned. */
export type Edition = 'working' | 'published'

/** One athlete in one session. */
export interface Place {
  sessionId: string
  athleteId: string
}

/**
 * Makes whoever else rebuilds one of these places wait until the transaction ends; the statements after it then see
 * what the other wrote. In one order, so that two who rebuild several wait for each other and never lock up.
 */
export async function lockPlaces(tx: Tx, clubId: string, places: readonly Place[]): Promise<void> {
  const keys = places.map(({ sessionId, athleteId }) => `${clubId}/${sessionId}/${athleteId}`).sort()
  await tx.execute(
    sql`select pg_advisory_xact_lock(hashtextextended(place, 0)) from unnest(${sql.param(keys)}::text[]) as place`,
  )
}

/** True of rows whose session and athlete are one of these places. */
const isOneOf = (places: readonly Place[], sessionId: PgColumn, athleteId: PgColumn): SQL => {
  const [sessionIds, athleteIds] = [
    places.map((place) => place.sessionId),
    places.map((place) => place.athleteId),
  ]
  return sql`(${sessionId}, ${athleteId}) in (select * from unnest(${sql.param(sessionIds)}::uuid[], ${sql.param(athleteIds)}::uuid[]))`
}

const included = {
  sessionId: trials.sessionId,
  trialId: trials.id,
  analysisId: analyses.id,
  test: {
    protocol: sql<Test['protocol']>`${trials.protocol}`,
    side: sql<Test['side']>`${trials.side}`,
    externalLoadKg: trials.externalLoadKg,
    boxHeightM: trials.boxHeightM,
    arms: sql<Test['arms']>`${trials.arms}`,
  },
  metricValues: analyses.metricValues,
  metricUncertainties: analyses.metricUncertainties,
  checks: analyses.checks,
}
const inOrder = [asc(trials.droppedAt), asc(trials.ordinal), asc(trials.id)]

/** The trials that count on the sheets of these places: analysed, not set aside. */
export function workingTrials(tx: Tx, clubId: string, places: readonly Place[]) {
  return tx
    .select({ ...included, athleteId: sql<string>`${trials.athleteId}` })
    .from(trials)
    .innerJoin(
      analyses,
      and(eq(analyses.clubId, trials.clubId), eq(analyses.trialId, trials.id), isNull(analyses.supersededAt)),
    )
    .where(
      and(
        eq(trials.clubId, clubId),
        isOneOf(places, trials.sessionId, trials.athleteId),
        isNull(trials.setAsideAt),
      ),
    )
    .orderBy(...inOrder)
}

/** The trials and analyses that the newest publication pinned for the athletes of these places. */
export function pinnedTrials(tx: Tx, clubId: string, places: readonly Place[]) {
  return tx
    .select({ ...included, athleteId: publishedTrials.athleteId })
    .from(publishedTrials)
    .innerJoin(trials, and(eq(trials.clubId, publishedTrials.clubId), eq(trials.id, publishedTrials.trialId)))
    .innerJoin(
      analyses,
      and(eq(analyses.clubId, publishedTrials.clubId), eq(analyses.id, publishedTrials.analysisId)),
    )
    .where(
      and(
        eq(publishedTrials.clubId, clubId),
        isOneOf(places, trials.sessionId, publishedTrials.athleteId),
        eq(publishedTrials.current, true),
      ),
    )
    .orderBy(...inOrder)
}

/** A result with its place. */
export type PlacedResult = Place & GatheredResult & { sessionDate: string }

/** Puts these results in the place of whatever the edition held of the places. */
export async function replaceResults(
  tx: Tx,
  of: { clubId: string; edition: Edition; places: readonly Place[] },
  results: readonly PlacedResult[],
): Promise<void> {
  const { clubId, edition, places } = of
  await tx
    .delete(sessionResults)
    .where(
      and(
        eq(sessionResults.clubId, clubId),
        eq(sessionResults.edition, edition),
        isOneOf(places, sessionResults.sessionId, sessionResults.athleteId),
      ),
    )
  if (results.length === 0) return
  await tx
    .insert(sessionResults)
    .values(results.map(({ test, ...result }) => ({ clubId, edition, ...test, ...result })))
}

/** Results of one edition, oldest first; of one athlete, or of one session. */
export function findResults(
  tx: Tx,
  of: { clubId: string; edition: Edition; athleteId?: string; sessionId?: string },
) {
  return tx
    .select({ result: sessionResults, sessionTitle: sessions.title, spreads: trialSpreads.spreads })
    .from(sessionResults)
    .innerJoin(
      sessions,
      and(eq(sessions.clubId, sessionResults.clubId), eq(sessions.id, sessionResults.sessionId)),
    )
    .leftJoin(
      trialSpreads,
      and(
        eq(trialSpreads.clubId, sessionResults.clubId),
        eq(trialSpreads.sessionId, sessionResults.sessionId),
        eq(trialSpreads.testKey, sessionResults.testKey),
        eq(trialSpreads.edition, sessionResults.edition),
      ),
    )
    .where(
      and(
        eq(sessionResults.clubId, of.clubId),
        eq(sessionResults.edition, of.edition),
        of.athleteId ? eq(sessionResults.athleteId, of.athleteId) : undefined,
        of.sessionId ? eq(sessionResults.sessionId, of.sessionId) : undefined,
      ),
    )
    .orderBy(asc(sessionResults.sessionDate), asc(sessions.createdAt), asc(sessionResults.testKey))
}
export type FoundResult = Awaited<ReturnType<typeof findResults>>[number]

/** Everybody who has, or had, a pinned trial in the session. */
export async function athletesEverPinned(tx: Tx, clubId: string, sessionId: string): Promise<string[]> {
  const rows = await tx
    .selectDistinct({ athleteId: publishedTrials.athleteId })
    .from(publishedTrials)
    .innerJoin(trials, and(eq(trials.clubId, publishedTrials.clubId), eq(trials.id, publishedTrials.trialId)))
    .where(
      and(
        eq(publishedTrials.clubId, clubId),
        eq(trials.sessionId, sessionId),
        isNotNull(publishedTrials.athleteId),
      ),
    )
  return rows.map(({ athleteId }) => athleteId)
}

/** Session → its day. */
export async function datesOfSessions(
  tx: Tx,
  clubId: string,
  sessionIds: string[],
): Promise<Map<string, string>> {
  const rows = await tx
    .select({ id: sessions.id, date: sessions.date })
    .from(sessions)
    .where(and(eq(sessions.clubId, clubId), inArray(sessions.id, sessionIds)))
  return new Map(rows.map(({ id, date }) => [id, date]))
}

export async function redateResults(
  tx: Tx,
  { clubId, sessionId, sessionDate }: { clubId: string; sessionId: string; sessionDate: string },
): Promise<void> {
  await tx
    .update(sessionResults)
    .set({ sessionDate })
    .where(and(eq(sessionResults.clubId, clubId), eq(sessionResults.sessionId, sessionId)))
}

export async function athleteName(tx: Tx, clubId: string, athleteId: string): Promise<string> {
  const [row] = await tx
    .select({ name: athletes.name })
    .from(athletes)
    .where(and(eq(athletes.clubId, clubId), eq(athletes.id, athleteId)))
  return row.name
}
