import { randomUUID } from 'node:crypto'
import { nothingKnown } from '../../server/modules/analyses/inputs.ts'
import { workerContext, type Database } from '../../server/db/database.ts'
import { recomputeBatches, recomputes } from '../../server/db/schema/recomputes.ts'

/** A dry run of the club that was done, in one batch; returns its id. Needs a database of the web role. */
export async function buildRecompute(
  db: Database,
  clubId: string,
  { requestedBy, trialIds }: { requestedBy: string; trialIds: string[] },
): Promise<string> {
  const id = randomUUID()
  const row = { scope: 'club', dryRun: true, state: 'done', engineVersion: 'built', madeWith: nothingKnown }
  await db.inClub(workerContext(clubId), async (tx) => {
    await tx.insert(recomputes).values({ clubId, id, ...row, total: trialIds.length, requestedBy })
    await tx.insert(recomputeBatches).values({ clubId, recomputeId: id, n: 0, trialIds })
  })
  return id
}
