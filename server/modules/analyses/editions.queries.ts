import { and, desc, eq, sql } from 'drizzle-orm'
import type { Tx } from '../../db/database.ts'
import { analyses, publishedTrials, trials } from '../../db/schema/trials.ts'

/** Every analysis of a trial, newest first. */
export function analysesOfTrial(tx: Tx, clubId: string, trialId: string) {
  return tx
    .select({
      id: analyses.id,
      createdAt: analyses.createdAt,
      engineVersion: analyses.engineVersion,
      supersededAt: analyses.supersededAt,
      inputs: analyses.inputs,
      metricValues: analyses.metricValues,
      metricUncertainties: analyses.metricUncertainties,
      checks: analyses.checks,
      published: sql<boolean>`exists (select 1 from ${publishedTrials} where ${publishedTrials.clubId} = ${analyses.clubId}
        and ${publishedTrials.analysisId} = ${analyses.id} and ${publishedTrials.current})`,
    })
    .from(analyses)
    .where(and(eq(analyses.clubId, clubId), eq(analyses.trialId, trialId)))
    .orderBy(desc(analyses.createdAt), desc(analyses.id))
}
export type EditionRow = Awaited<ReturnType<typeof analysesOfTrial>>[number]

export async function isTrial(tx: Tx, clubId: string, trialId: string): Promise<boolean> {
  const [row] = await tx
    .select({ id: trials.id })
    .from(trials)
    .where(and(eq(trials.clubId, clubId), eq(trials.id, trialId)))
  return row !== undefined
}
