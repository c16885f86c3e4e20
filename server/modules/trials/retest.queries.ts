import { and, eq, inArray, isNull, sql } from 'drizzle-orm'
import type { Test } from '../../../shared/contracts/tests.ts'
import type { Tx } from '../../db/database.ts'
import { analyses, trials } from '../../db/schema/trials.ts'

/** Gives every trial of the session that has one test the other, and supersedes its analysis; which those were. */
export async function putToTest(
  tx: Tx,
  { clubId, sessionId }: { clubId: string; sessionId: string },
  from: Test,
  to: Test,
): Promise<{ id: string; athleteId: string | null }[]> {
  const put = await tx
    .update(trials)
    .set({ ...to, version: sql`${trials.version} + 1` })
    .where(
      and(
        eq(trials.clubId, clubId),
        eq(trials.sessionId, sessionId),
        eq(trials.protocol, from.protocol),
        eq(trials.side, from.side),
        eq(trials.externalLoadKg, from.externalLoadKg),
        from.boxHeightM === null ? isNull(trials.boxHeightM) : eq(trials.boxHeightM, from.boxHeightM),
        eq(trials.arms, from.arms),
      ),
    )
    .returning({ id: trials.id, athleteId: trials.athleteId })
  const ids = put.map(({ id }) => id)
  await tx
    .update(analyses)
    .set({ supersededAt: sql`now()` })
    .where(and(eq(analyses.clubId, clubId), inArray(analyses.trialId, ids), isNull(analyses.supersededAt)))
  return put
}
