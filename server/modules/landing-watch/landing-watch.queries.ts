import { and, eq, gte, sql } from 'drizzle-orm'
import type { Protocol } from '../../../shared/contracts/tests.ts'
import type { z } from 'zod'
import type { Tx } from '../../db/database.ts'
import { athletes, settings } from '../../db/schema/people-of-club.ts'
import { sessionResults } from '../../db/schema/results.ts'
import { sessions } from '../../db/schema/sessions.ts'
import { analyses } from '../../db/schema/trials.ts'

export type LandingLimits = Partial<Record<z.infer<typeof Protocol>, number>>

export async function findLimits(tx: Tx, clubId: string): Promise<LandingLimits> {
  const [row] = await tx
    .select({ limits: settings.landingPeakLimits })
    .from(settings)
    .where(eq(settings.clubId, clubId))
  return (row?.limits ?? {}) as LandingLimits
}

const metric = 'landingPeakForcePerBodyWeight'

/**
 * Landings of the sheets as they stand, since a day, above the limit of their protocol. The peak is read from the
 * analysis, since a result holds none where a failed check took it away: those are listed as unverified.
 */
export function landingsAbove(tx: Tx, of: { clubId: string; since: string; limits: LandingLimits }) {
  const limit = sql<number>`(${JSON.stringify(of.limits)}::jsonb ->> ${sessionResults.protocol})::float8`
  const peak = sql<number>`(${analyses.metricValues} ->> ${metric})::float8`
  const place = sql`array_position(${sessionResults.analysisIds}, ${analyses.id})`
  return tx
    .select({
      trialId: analyses.trialId,
      sessionId: sessionResults.sessionId,
      sessionTitle: sessions.title,
      date: sessionResults.sessionDate,
      athlete: { id: athletes.id, name: athletes.name },
      test: {
        protocol: sql<z.infer<typeof Protocol>>`${sessionResults.protocol}`,
        side: sql<'both' | 'left' | 'right'>`${sessionResults.side}`,
        externalLoadKg: sessionResults.externalLoadKg,
        boxHeightM: sessionResults.boxHeightM,
        arms: sql<'hips' | 'free'>`${sessionResults.arms}`,
      },
      peak,
      U: sql<number | null>`(${analyses.metricUncertainties} -> ${metric} ->> 0)::float8`,
      limit,
      unverified: sql<boolean>`${sessionResults.metricValues} -> ${metric} ->> (${place} - 1) is null`,
    })
    .from(sessionResults)
    .innerJoin(
      analyses,
      and(
        eq(analyses.clubId, sessionResults.clubId),
        sql`${analyses.id} = any(${sessionResults.analysisIds})`,
      ),
    )
    .innerJoin(
      sessions,
      and(eq(sessions.clubId, sessionResults.clubId), eq(sessions.id, sessionResults.sessionId)),
    )
    .innerJoin(
      athletes,
      and(eq(athletes.clubId, sessionResults.clubId), eq(athletes.id, sessionResults.athleteId)),
    )
    .where(
      and(
        eq(sessionResults.clubId, of.clubId),
        eq(sessionResults.edition, 'working'),
        gte(sessionResults.sessionDate, of.since),
        sql`${peak} > ${limit}`,
      ),
    )
    .orderBy(sql`${peak} desc`, analyses.trialId)
}
