import { and, eq, isNull, ne, sql } from 'drizzle-orm'
import type { Tx } from '../../db/database.ts'
import { athletes } from '../../db/schema/people-of-club.ts'
import { analyses, eventMoves, trials, trialSamples, type AnalysisInputs } from '../../db/schema/trials.ts'

export type AnalysisRow = typeof analyses.$inferSelect
export type NewAnalysis = Omit<typeof analyses.$inferInsert, 'id' | 'supersededAt' | 'createdAt'>

/** A trial with what its analysis is made from, as it stands now; its samples, which never change, are apart. */
export async function findTrialToAnalyse(tx: Tx, clubId: string, trialId: string) {
  const [row] = await tx
    .select({
      sessionId: trials.sessionId,
      athleteId: trials.athleteId,
      test: {
        protocol: trials.protocol,
        side: trials.side,
        externalLoadKg: trials.externalLoadKg,
        boxHeightM: trials.boxHeightM,
        arms: trials.arms,
      } satisfies Record<keyof AnalysisInputs['test'], unknown>,
      recordedMassKg: athletes.recordedMassKg,
      channels: trialSamples.channels,
      movedEvents: eventMoves.events,
    })
    .from(trials)
    .innerJoin(trialSamples, and(eq(trialSamples.clubId, trials.clubId), eq(trialSamples.trialId, trials.id)))
    .leftJoin(athletes, and(eq(athletes.clubId, trials.clubId), eq(athletes.id, trials.athleteId)))
    .leftJoin(
      eventMoves,
      and(
        eq(eventMoves.clubId, trials.clubId),
        eq(eventMoves.trialId, trials.id),
        isNull(eventMoves.supersededAt),
      ),
    )
    .where(and(eq(trials.clubId, clubId), eq(trials.id, trialId)))
  return row ?? null
}
export type TrialRow = NonNullable<Awaited<ReturnType<typeof findTrialToAnalyse>>>

export async function findSamples(tx: Tx, clubId: string, trialId: string): Promise<Buffer> {
  const [row] = await tx
    .select({ bytes: trialSamples.bytes })
    .from(trialSamples)
    .where(and(eq(trialSamples.clubId, clubId), eq(trialSamples.trialId, trialId)))
  return row.bytes
}

/** Until the transaction ends nobody changes the trial, nor analyses it. */
export async function lockTrial(tx: Tx, clubId: string, trialId: string): Promise<void> {
  await tx
    .select({ id: trials.id })
    .from(trials)
    .where(and(eq(trials.clubId, clubId), eq(trials.id, trialId)))
    .for('update')
}

export interface AnalysisKey {
  clubId: string
  trialId: string
  engineVersion: string
  inputsHash: Buffer
}

export async function findAnalysisId(tx: Tx, key: AnalysisKey): Promise<string | null> {
  const [row] = await tx
    .select({ id: analyses.id })
    .from(analyses)
    .where(
      and(
        eq(analyses.clubId, key.clubId),
        eq(analyses.trialId, key.trialId),
        eq(analyses.engineVersion, key.engineVersion),
        eq(analyses.inputsHash, key.inputsHash),
      ),
    )
  return row?.id ?? null
}

/** Makes an analysis that was superseded the current one again. */
export async function restoreAnalysis(tx: Tx, clubId: string, trialId: string, id: string): Promise<void> {
  await supersede(tx, clubId, trialId, id)
  await tx
    .update(analyses)
    .set({ supersededAt: null })
    .where(and(eq(analyses.clubId, clubId), eq(analyses.id, id)))
}

/** Writes the analysis and supersedes the trial's older one. */
export async function insertAnalysis(tx: Tx, analysis: NewAnalysis): Promise<void> {
  await supersede(tx, analysis.clubId, analysis.trialId)
  await tx.insert(analyses).values(analysis)
}

async function supersede(tx: Tx, clubId: string, trialId: string, except?: string): Promise<void> {
  await tx
    .update(analyses)
    .set({ supersededAt: sql`now()` })
    .where(
      and(
        eq(analyses.clubId, clubId),
        eq(analyses.trialId, trialId),
        isNull(analyses.supersededAt),
        except ? ne(analyses.id, except) : undefined,
      ),
    )
}

/** The trial's current analysis, or the one of that id. */
export async function findAnalysis(
  tx: Tx,
  clubId: string,
  which: { trialId: string } | { analysisId: string },
): Promise<AnalysisRow | null> {
  const [row] = await tx
    .select()
    .from(analyses)
    .where(
      and(
        eq(analyses.clubId, clubId),
        'trialId' in which
          ? and(eq(analyses.trialId, which.trialId), isNull(analyses.supersededAt))
          : eq(analyses.id, which.analysisId),
      ),
    )
  return row ?? null
}
