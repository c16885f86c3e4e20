/** Trials of a usual length in one job: some 0.1 s of a core, far below the queue's expiry. */
const trialsInBatch = 50
/** 8 s at 1000 Hz; a longer recording takes the place of several. */
const usualSamples = 8000

/** Cuts trials into jobs of about the same work, in their order. */
export function cutBatches(trials: readonly { trialId: string; samples: number }[]): string[][] {
  const batches: string[][] = []
  let weight = Infinity
  for (const { trialId, samples } of trials) {
    if (weight >= trialsInBatch) {
      batches.push([])
      weight = 0
    }
    batches.at(-1)?.push(trialId)
    weight += Math.max(1, samples / usualSamples)
  }
  return batches
}
