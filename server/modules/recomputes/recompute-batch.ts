import { engineVersion } from '../../../shared/mechanics/version.ts'
import type { ClubContext, Tx } from '../../db/database.ts'
import type { Moves } from '../../db/schema/recomputes.ts'
import type { JobDeps } from '../../jobs/define-job.ts'
import { sendJobs } from '../../jobs/queue.ts'
import { keepRemade, remake, type Remade } from '../analyses/remake.service.ts'
import { notify } from '../events/notify.ts'
import { compareTrial } from './compare.ts'
import { noMoves } from './moves.ts'
import { completeBatch, endRecompute, findBatch, lockBatch, markRunning } from './recomputes.queries.ts'

/**
 * One job of a recompute: analyses its trials again, stores that unless it is a dry run, and notes what moved. Safe
 * to run twice: a batch is done once, and a recompute that was cancelled meanwhile begins none.
 */
export async function runBatch(
  deps: JobDeps,
  ctx: ClubContext,
  { recomputeId: id, n }: { recomputeId: string; n: number },
): Promise<void> {
  const { clubId } = ctx
  const batch = await deps.db.inClub(ctx, async (tx) => {
    await markRunning(tx, clubId, id, deps.clock())
    return findBatch(tx, clubId, id, n)
  })
  if (!batch) return
  if (batch.engineVersion !== engineVersion)
    throw new Error(`asked of engine ${batch.engineVersion}, this is ${engineVersion}`)
  const { remade, failed } = await remake(deps, ctx, batch.trialIds, batch.madeWith)
  await deps.db.inClub(ctx, async (tx) => {
    if (!(await lockBatch(tx, clubId, id, n))) return
    const kept = batch.dryRun ? remade : await keepRemade(tx, ctx, remade)
    if (!batch.dryRun) await tellSheets(tx, clubId, kept)
    const done = { clubId, id, n, trials: batch.trialIds.length, doneAt: deps.clock() }
    const isLast = await completeBatch(tx, { ...done, moves: movesOf(kept, failed) })
    if (isLast) await sendJobs(tx, 'add-up-moves', { version: 1, clubId, recomputeId: id })
    await notify(tx, clubId, { kind: 'recomputes', id })
  })
}

/** Every try of a batch ended badly: the recompute says so, and what was made already stays. */
export async function giveUp(deps: JobDeps, ctx: ClubContext, id: string): Promise<void> {
  const { clubId } = ctx
  await deps.db.inClub(ctx, async (tx) => {
    if (!(await endRecompute(tx, clubId, id, { state: 'failed', finishedAt: deps.clock() }))) return
    await sendJobs(tx, 'add-up-moves', { version: 1, clubId, recomputeId: id })
    await notify(tx, clubId, { kind: 'recomputes', id })
  })
}

function movesOf(remade: readonly Remade[], failed: string[]): Moves {
  const moves = { ...noMoves(), failed }
  for (const { trialId, sessionId, published, before, after } of remade) {
    if (!compareTrial(moves, trialId, before, after)) continue
    const session = (moves.sessions[sessionId] ??= { moved: 0, published: 0 })
    session.moved += 1
    if (published) session.published += 1
  }
  return moves
}

async function tellSheets(tx: Tx, clubId: string, kept: readonly Remade[]): Promise<void> {
  for (const id of new Set(kept.map(({ sessionId }) => sessionId)))
    await notify(tx, clubId, { kind: 'session', id })
}
