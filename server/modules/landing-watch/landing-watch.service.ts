import type { listHighLandings } from '../../../shared/contracts/landing-watch.ts'
import type { ResponseOf } from '../../../shared/contracts/endpoint.ts'
import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { findLimits, landingsAbove } from './landing-watch.queries.ts'

const dayMs = 24 * 60 * 60 * 1000

/** Landings of the last `days` above the club's limits, heaviest first; without a limit, none. */
export function highLandings(
  deps: Deps,
  ctx: Caller,
  days: number,
): Promise<ResponseOf<typeof listHighLandings>> {
  const since = new Date(deps.clock().getTime() - days * dayMs).toISOString().slice(0, 10)
  return deps.db.inClub(ctx, async (tx) => {
    const limits = await findLimits(tx, ctx.clubId)
    return { limits, landings: await landingsAbove(tx, { clubId: ctx.clubId, since, limits }) }
  })
}
