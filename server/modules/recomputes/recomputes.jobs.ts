import { workerContext } from '../../db/database.ts'
import { defineJob } from '../../jobs/define-job.ts'
import { addUp } from './add-up-moves.ts'
import { giveUp, runBatch } from './recompute-batch.ts'

export const recomputeBatchJob = defineJob('recompute-batch', (deps, { clubId, recomputeId, n }) =>
  runBatch(deps, workerContext(clubId), { recomputeId, n }),
)

/** When the last batch is done, or a recompute was ended before. */
export const addUpMovesJob = defineJob('add-up-moves', (deps, { clubId, recomputeId }) =>
  addUp(deps, workerContext(clubId), recomputeId),
)

export const giveUpRecomputingJob = defineJob('give-up-recomputing', (deps, { clubId, recomputeId }) =>
  giveUp(deps, workerContext(clubId), recomputeId),
)
