import { isSameTest } from '../../../shared/contracts/session-test.ts'
import type { Test } from '../../../shared/contracts/tests.ts'
import type { ClubContext, Tx } from '../../db/database.ts'
import { sendJobs } from '../../jobs/queue.ts'
import { rebuildWorking } from '../results/results.service.ts'
import { putToTest } from './retest.queries.ts'

/**
 * Puts a session's trials that have one test to another, and has them analysed anew. Until then they have no figures:
 * those of the other test would stand under the wrong name. What is published stays as it was.
 */
export async function retest(
  tx: Tx,
  ctx: ClubContext,
  sessionId: string,
  { from, to }: { from: Test; to: Test },
): Promise<void> {
  if (isSameTest(from, to)) return
  const { clubId } = ctx
  const put = await putToTest(tx, { clubId, sessionId }, from, to)
  if (put.length === 0) return
  await sendJobs(tx, 'analyse-trial', ...put.map(({ id }) => ({ version: 1 as const, clubId, trialId: id })))
  await rebuildWorking(
    tx,
    ctx,
    sessionId,
    put.map(({ athleteId }) => athleteId),
  )
}
