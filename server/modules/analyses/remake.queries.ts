import { and, asc, count, eq, inArray, isNull, type SQL, sql } from 'drizzle-orm'
import type { Tx } from '../../db/database.ts'
import type { MadeWith } from '../../db/schema/recomputes.ts'
import { analyses, publishedTrials, trials, trialSamples } from '../../db/schema/trials.ts'

/** Whose trials: an athlete's, a session's, or with neither the club's. */
export interface TrialScope {
  sessionId?: string | undefined
  athleteId?: string | undefined
}

/** What analyses are held against. */
export interface Now {
  engineVersion: string
  madeWith: MadeWith
}

const differs = ({ engineVersion, madeWith }: Now) => {
  const { settings, changedSettings = {}, gravity, calibrationU } = madeWith
  const otherEngine = sql`${analyses.engineVersion} <> ${engineVersion}`
  const otherSettings = sql`(${analyses.inputs} ->> 'settings' <> ${settings}
    or coalesce(${analyses.inputs} -> 'changedSettings', '{}') <> ${JSON.stringify(changedSettings)}::jsonb)`
  const otherPlates = sql`((${analyses.inputs} ->> 'gravity')::float8 <> ${gravity}::float8
    or not ${analyses.inputs} -> 'calibrationU' <@ ${JSON.stringify(calibrationU)}::jsonb)`
  return {
    otherEngine,
    otherSettings,
    otherPlates,
    any: sql`(${otherEngine} or ${otherSettings} or ${otherPlates})`,
  }
}

const ofScope = (clubId: string, { sessionId, athleteId }: TrialScope) =>
  and(
    eq(trials.clubId, clubId),
    sessionId ? eq(trials.sessionId, sessionId) : undefined,
    athleteId ? eq(trials.athleteId, athleteId) : undefined,
  )

const withCurrent = and(
  eq(analyses.clubId, trials.clubId),
  eq(analyses.trialId, trials.id),
  isNull(analyses.supersededAt),
)

const countWhere = (condition: SQL) => sql<number>`count(*) filter (where ${condition})`.mapWith(Number)

/** How many of the scope's current analyses were made with something else than now. */
export async function countStale(tx: Tx, clubId: string, scope: TrialScope, now: Now) {
  const { any, otherEngine, otherSettings, otherPlates } = differs(now)
  const [row] = await tx
    .select({
      total: count(),
      stale: countWhere(any),
      otherEngine: countWhere(otherEngine),
      otherSettings: countWhere(otherSettings),
      otherPlates: countWhere(otherPlates),
    })
    .from(trials)
    .innerJoin(analyses, withCurrent)
    .where(ofScope(clubId, scope))
  return row
}

/** The trials of those analyses with how many samples each has: by session and athlete, so that a batch has few of both. */
export function staleTrials(tx: Tx, clubId: string, scope: TrialScope, now: Now) {
  return tx
    .select({ trialId: trials.id, samples: trialSamples.sampleCount })
    .from(trials)
    .innerJoin(analyses, withCurrent)
    .innerJoin(trialSamples, and(eq(trialSamples.clubId, trials.clubId), eq(trialSamples.trialId, trials.id)))
    .where(and(ofScope(clubId, scope), differs(now).any))
    .orderBy(asc(trials.sessionId), asc(trials.athleteId), asc(trials.id))
}

const figures = {
  metricValues: analyses.metricValues,
  metricUncertainties: analyses.metricUncertainties,
  sides: analyses.sides,
  checks: analyses.checks,
}

/** Trials with their samples and their current analysis, and whether an athlete reads them. */
export function trialsToRemake(tx: Tx, clubId: string, trialIds: readonly string[]) {
  return tx
    .select({
      trialId: trials.id,
      sessionId: trials.sessionId,
      athleteId: trials.athleteId,
      channels: trialSamples.channels,
      samples: trialSamples.bytes,
      currentId: analyses.id,
      engineVersion: analyses.engineVersion,
      inputsHash: analyses.inputsHash,
      inputs: analyses.inputs,
      figures,
      published: sql<boolean>`exists (select 1 from ${publishedTrials} where ${publishedTrials.clubId} = ${trials.clubId}
        and ${publishedTrials.trialId} = ${trials.id} and ${publishedTrials.current})`,
    })
    .from(trials)
    .innerJoin(trialSamples, and(eq(trialSamples.clubId, trials.clubId), eq(trialSamples.trialId, trials.id)))
    .innerJoin(analyses, withCurrent)
    .where(and(eq(trials.clubId, clubId), inArray(trials.id, [...trialIds])))
}
export type TrialToRemake = Awaited<ReturnType<typeof trialsToRemake>>[number]

/** Analyses of these trials that this engine made already, current or not. */
export function analysesByEngine(tx: Tx, clubId: string, trialIds: readonly string[], engineVersion: string) {
  return tx
    .select({ id: analyses.id, trialId: analyses.trialId, inputsHash: analyses.inputsHash, figures })
    .from(analyses)
    .where(
      and(
        eq(analyses.clubId, clubId),
        inArray(analyses.trialId, [...trialIds]),
        eq(analyses.engineVersion, engineVersion),
      ),
    )
}
export type EarlierAnalysis = Awaited<ReturnType<typeof analysesByEngine>>[number]

/** Until the transaction ends nobody changes these trials, nor analyses them; their current analyses' ids. */
export async function lockTrials(tx: Tx, clubId: string, trialIds: readonly string[]): Promise<Set<string>> {
  await tx
    .select({ id: trials.id })
    .from(trials)
    .where(and(eq(trials.clubId, clubId), inArray(trials.id, [...trialIds])))
    .orderBy(asc(trials.id))
    .for('update')
  const current = await tx
    .select({ id: analyses.id })
    .from(analyses)
    .where(
      and(
        eq(analyses.clubId, clubId),
        inArray(analyses.trialId, [...trialIds]),
        isNull(analyses.supersededAt),
      ),
    )
  return new Set(current.map(({ id }) => id))
}

/** Supersedes the trials' current analyses. */
export async function supersedeAll(tx: Tx, clubId: string, trialIds: readonly string[]): Promise<void> {
  await tx
    .update(analyses)
    .set({ supersededAt: sql`now()` })
    .where(
      and(
        eq(analyses.clubId, clubId),
        inArray(analyses.trialId, [...trialIds]),
        isNull(analyses.supersededAt),
      ),
    )
}

/** Makes superseded analyses current again. */
export async function restoreAll(tx: Tx, clubId: string, ids: readonly string[]): Promise<void> {
  await tx
    .update(analyses)
    .set({ supersededAt: null })
    .where(and(eq(analyses.clubId, clubId), inArray(analyses.id, [...ids])))
}

export async function insertAnalyses(tx: Tx, rows: (typeof analyses.$inferInsert)[]): Promise<void> {
  await tx.insert(analyses).values(rows)
}
