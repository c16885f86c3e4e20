import { and, eq, inArray, sql } from 'drizzle-orm'
import { sheetMetrics } from '../../../shared/contracts/sheet-metrics.ts'
import type { Tx } from '../../db/database.ts'
import { sessionResults, trialSpreads } from '../../db/schema/results.ts'
import type { Spreads } from './means.ts'
import type { Edition } from './results.queries.ts'

/** One edition of the results of some sessions. */
export interface SpreadsPlace {
  clubId: string
  edition: Edition
  sessionIds: readonly string[]
}

/** In one order, so that two who rebuild several wait for each other and never lock up. */
export async function lockSpreads(tx: Tx, { clubId, edition, sessionIds }: SpreadsPlace): Promise<void> {
  const keys = sessionIds.map((sessionId) => `${clubId}/${sessionId}/${edition}`).sort()
  await tx.execute(
    sql`select pg_advisory_xact_lock(hashtextextended(place, 0)) from unnest(${sql.param(keys)}::text[]) as place`,
  )
}

/** What the sessions' results say of the metrics that have means, and no more: a result has ten times as many. */
export function valuesOfSessions(tx: Tx, { clubId, edition, sessionIds }: SpreadsPlace) {
  const ofMeans = sheetMetrics.map(
    (metric) => sql`${metric}::text, ${sessionResults.metricValues} -> ${metric}`,
  )
  return tx
    .select({
      sessionId: sessionResults.sessionId,
      testKey: sessionResults.testKey,
      metricValues: sql<
        Record<string, (number | null)[]>
      >`jsonb_strip_nulls(jsonb_build_object(${sql.join(ofMeans, sql`, `)}))`,
    })
    .from(sessionResults)
    .where(
      and(
        eq(sessionResults.clubId, clubId),
        inArray(sessionResults.sessionId, [...sessionIds]),
        eq(sessionResults.edition, edition),
      ),
    )
}

export async function replaceSpreads(
  tx: Tx,
  { clubId, edition, sessionIds }: SpreadsPlace,
  rows: { sessionId: string; testKey: string; spreads: Spreads }[],
): Promise<void> {
  await tx
    .delete(trialSpreads)
    .where(
      and(
        eq(trialSpreads.clubId, clubId),
        inArray(trialSpreads.sessionId, [...sessionIds]),
        eq(trialSpreads.edition, edition),
      ),
    )
  if (rows.length > 0) await tx.insert(trialSpreads).values(rows.map((row) => ({ clubId, edition, ...row })))
}
