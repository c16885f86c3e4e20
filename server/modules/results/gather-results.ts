import { type Test } from '../../../shared/contracts/tests.ts'
import { testKey } from '../../../shared/contracts/tests.ts'
import type { TrialCheck } from '../../../shared/mechanics/types.ts'
import { withheldMetrics } from '../../../shared/mechanics/withheld.ts'

/** A trial that counts, with the analysis that counts for it. */
export interface IncludedTrial {
  trialId: string
  analysisId: string
  test: Test
  metricValues: Record<string, number>
  metricUncertainties: Record<string, [number | null, number, number | null, number]>
  checks: TrialCheck[]
}

type Column = Record<string, (number | null)[]>

/** The numbers of one test's trials in arrays, a place a trial. */
export interface GatheredResult {
  test: Test
  testKey: string
  trialIds: string[]
  analysisIds: string[]
  metricValues: Column
  metricU: Column
  metricURepeat: Column
}

/** Trials → one result a test, in the order of the trials. What a failed check takes away stands as null. */
export function gatherResults(trials: readonly IncludedTrial[]): GatheredResult[] {
  const byTest = new Map<string, IncludedTrial[]>()
  for (const trial of trials) {
    const key = testKey(trial.test)
    byTest.set(key, [...(byTest.get(key) ?? []), trial])
  }
  return [...byTest].map(([key, ofTest]) => gatherOne(key, ofTest))
}

function gatherOne(key: string, trials: IncludedTrial[]): GatheredResult {
  const withheld = trials.map(
    ({ metricValues, checks }) => new Set(withheldMetrics({ metrics: metricValues, checks })),
  )
  const metrics = [...new Set(trials.flatMap(({ metricValues }) => Object.keys(metricValues)))].sort()
  const column = (pick: (trial: IncludedTrial, metric: string) => number | null | undefined): Column =>
    Object.fromEntries(
      metrics.map((metric) => [
        metric,
        trials.map((trial, i) => (withheld[i].has(metric) ? null : (pick(trial, metric) ?? null))),
      ]),
    )
  return {
    test: trials[0].test,
    testKey: key,
    trialIds: trials.map(({ trialId }) => trialId),
    analysisIds: trials.map(({ analysisId }) => analysisId),
    metricValues: column((trial, metric) => trial.metricValues[metric]),
    metricU: column((trial, metric) => trial.metricUncertainties[metric]?.[0]),
    metricURepeat: column((trial, metric) => trial.metricUncertainties[metric]?.[2]),
  }
}
