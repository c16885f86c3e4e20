import { and, asc, eq, isNotNull, isNull, notInArray, sql } from 'drizzle-orm'
import type { Test } from '../../../shared/contracts/tests.ts'
import type { Tx } from '../../db/database.ts'
import { athletes } from '../../db/schema/people-of-club.ts'
import { sessionResults, trialSpreads } from '../../db/schema/results.ts'
import { sessions } from '../../db/schema/sessions.ts'
import { analyses, publishedTrials, trials } from '../../db/schema/trials.ts'
import type { GatheredResult, IncludedTrial } from './gather-results.ts'

/** 'working' follows the sheet; 'published' holds what the newest publication pinned. */
export type Edition = 'working' | 'published'

/** One athlete in one session of a club. */
export interface Place {
  clubId: string
  sessionId: string
  athleteId: string
}

/**
 * Makes whoever else rebuilds this place wait until the transaction ends; the statements after it then see what
 * the other wrote.
 */
export async function lockPlace(tx: Tx, { clubId, sessionId, athleteId }: Place): Promise<void> {
  const place = `${clubId}/${sessionId}/${athleteId}`
  await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${place}, 0))`)
}

const included = {
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

/** The trials that count on the sheet: on the athlete, analysed, not set aside. */
export function workingTrials(tx: Tx, { clubId, sessionId, athleteId }: Place): Promise<IncludedTrial[]> {
  return tx
    .select(included)
    .from(trials)
    .innerJoin(
      analyses,
      and(eq(analyses.clubId, trials.clubId), eq(analyses.trialId, trials.id), isNull(analyses.supersededAt)),
    )
    .where(
      and(
        eq(trials.clubId, clubId),
        eq(trials.sessionId, sessionId),
        eq(trials.athleteId, athleteId),
        isNull(trials.setAsideAt),
      ),
    )
    .orderBy(...inOrder)
}

/** The trials and analyses that the newest publication pinned for the athlete. */
export function pinnedTrials(tx: Tx, { clubId, sessionId, athleteId }: Place): Promise<IncludedTrial[]> {
  return tx
    .select(included)
    .from(publishedTrials)
    .innerJoin(trials, and(eq(trials.clubId, publishedTrials.clubId), eq(trials.id, publishedTrials.trialId)))
    .innerJoin(
      analyses,
      and(eq(analyses.clubId, publishedTrials.clubId), eq(analyses.id, publishedTrials.analysisId)),
    )
    .where(
      and(
        eq(publishedTrials.clubId, clubId),
        eq(trials.sessionId, sessionId),
        eq(publishedTrials.athleteId, athleteId),
        eq(publishedTrials.current, true),
      ),
    )
    .orderBy(...inOrder)
}

/** Puts these results in the place of whatever the edition held of the athlete and session. */
export async function replaceResults(
  tx: Tx,
  place: Place & { edition: Edition; sessionDate: string },
  results: GatheredResult[],
): Promise<void> {
  const keys = results.map(({ testKey }) => testKey)
  await tx
    .delete(sessionResults)
    .where(
      and(
        eq(sessionResults.clubId, place.clubId),
        eq(sessionResults.sessionId, place.sessionId),
        eq(sessionResults.athleteId, place.athleteId),
        eq(sessionResults.edition, place.edition),
        keys.length > 0 ? notInArray(sessionResults.testKey, keys) : undefined,
      ),
    )
  if (results.length === 0) return
  await tx
    .insert(sessionResults)
    .values(results.map(({ test, ...result }) => ({ ...place, ...test, ...result })))
    .onConflictDoUpdate({
      target: [
        sessionResults.clubId,
        sessionResults.athleteId,
        sessionResults.sessionId,
        sessionResults.testKey,
        sessionResults.edition,
      ],
      set: {
        sessionDate: sql`excluded.session_date`,
        trialIds: sql`excluded.trial_ids`,
        analysisIds: sql`excluded.analysis_ids`,
        metricValues: sql`excluded.metric_values`,
        metricU: sql`excluded.metric_u`,
        metricURepeat: sql`excluded.metric_u_repeat`,
        rebuiltAt: sql`now()`,
      },
    })
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

export async function sessionDateOf(tx: Tx, clubId: string, sessionId: string): Promise<string> {
  const [row] = await tx
    .select({ date: sessions.date })
    .from(sessions)
    .where(and(eq(sessions.clubId, clubId), eq(sessions.id, sessionId)))
  return row.date
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
