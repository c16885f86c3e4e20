import { and, eq, sql } from 'drizzle-orm'
import { sheetMetrics } from '../../../shared/contracts/sheet-metrics.ts'
import type { Tx } from '../../db/database.ts'
import { sessionResults, trialSpreads } from '../../db/schema/results.ts'
import type { Spreads } from './means.ts'
import type { Edition } from './results.queries.ts'

/** One edition of a session's results. */
export interface SpreadsPlace {
  clubId: string
  sessionId: string
  edition: Edition
}

export async function lockSpreads(tx: Tx, { clubId, sessionId, edition }: SpreadsPlace): Promise<void> {
  const place = `${clubId}/${sessionId}/${edition}`
  await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${place}, 0))`)
}

/** What the session's results say of the metrics that have means, and no more: a result has ten times as many. */
export function valuesOfSession(tx: Tx, { clubId, sessionId, edition }: SpreadsPlace) {
  const ofMeans = sheetMetrics.map(
    (metric) => sql`${metric}::text, ${sessionResults.metricValues} -> ${metric}`,
  )
  return tx
    .select({
      testKey: sessionResults.testKey,
      metricValues: sql<
        Record<string, (number | null)[]>
      >`jsonb_strip_nulls(jsonb_build_object(${sql.join(ofMeans, sql`, `)}))`,
    })
    .from(sessionResults)
    .where(
      and(
        eq(sessionResults.clubId, clubId),
        eq(sessionResults.sessionId, sessionId),
        eq(sessionResults.edition, edition),
      ),
    )
}

export async function replaceSpreads(
  tx: Tx,
  { clubId, sessionId, edition }: SpreadsPlace,
  rows: { testKey: string; spreads: Spreads }[],
): Promise<void> {
  await tx
    .delete(trialSpreads)
    .where(
      and(
        eq(trialSpreads.clubId, clubId),
        eq(trialSpreads.sessionId, sessionId),
        eq(trialSpreads.edition, edition),
      ),
    )
  if (rows.length > 0)
    await tx.insert(trialSpreads).values(rows.map((row) => ({ clubId, sessionId, edition, ...row })))
}
