import type { ClubContext, Tx } from '../../db/database.ts'
import type { Deps } from '../../deps.ts'
import { notify } from '../events/notify.ts'
import { addMoves, noMoves } from './moves.ts'
import { endRecompute, lockMoves, storeMoves, takeMoves } from './recomputes.queries.ts'

/** Batches added up in one transaction, for bounded memory. */
const atOnce = 100

/** Adds what moved in the batches to the whole, and ends a recompute that is done. Safe to run twice. */
export async function addUp(deps: Deps, ctx: ClubContext, id: string): Promise<void> {
  for (;;) {
    const added = await deps.db.inClub(ctx, (tx) => addSome(deps, tx, ctx.clubId, id))
    if (added < atOnce) return
  }
}

async function addSome(deps: Deps, tx: Tx, clubId: string, id: string) {
  const found = await lockMoves(tx, clubId, id)
  if (!found) return 0
  const parts = await takeMoves(tx, clubId, id, atOnce)
  if (parts.length > 0) {
    const sum = found.moves ?? noMoves()
    for (const part of parts) addMoves(sum, part)
    await storeMoves(tx, clubId, id, sum)
  }
  if (parts.length < atOnce) {
    if (found.done === found.total)
      await endRecompute(tx, clubId, id, { state: 'done', finishedAt: deps.clock() })
    await notify(tx, clubId, { kind: 'recomputes', id })
  }
  return parts.length
}
