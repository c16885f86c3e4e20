import type { MeanFigure } from '../../../shared/contracts/results.ts'
import { sheetMetrics } from '../../../shared/contracts/sheet-metrics.ts'
import { meanOfTrials, type TrialFigure } from '../../../shared/statistics/mean-of-trials.ts'
import { pooledSpread } from '../../../shared/statistics/pooled-spread.ts'
import type { GatheredResult } from './gather-results.ts'

/** [SD, degrees of freedom] by metric. */
export type Spreads = Record<string, [number, number]>
type Columns = Pick<GatheredResult, 'metricValues' | 'metricU' | 'metricURepeat'>

/** Means of the metrics that a sheet and an athlete's page carry; one without a figure that counts is absent. */
export function meansOf(result: Columns, spreads: Spreads): Record<string, MeanFigure> {
  const means: Record<string, MeanFigure> = {}
  for (const metric of sheetMetrics) {
    const spread = spreads[metric]
    const pooled = spread ? { sd: spread[0], degreesOfFreedom: spread[1] } : null
    const mean = meanOfTrials(figuresOf(result, metric), pooled)
    if (mean) means[metric] = mean
  }
  return means
}

/** How much the trials of these athletes' results vary within an athlete, for the metrics that have means. */
export function spreadsOf(results: readonly Pick<Columns, 'metricValues'>[]): Spreads {
  const spreads: Spreads = {}
  for (const metric of sheetMetrics) {
    const counted = results.map(({ metricValues }) =>
      (metricValues[metric] ?? []).filter((value) => value !== null),
    )
    const pooled = pooledSpread(counted)
    if (pooled) spreads[metric] = [pooled.sd, pooled.degreesOfFreedom]
  }
  return spreads
}

function figuresOf({ metricValues, metricU, metricURepeat }: Columns, metric: string): TrialFigure[] {
  return (metricValues[metric] ?? []).flatMap((value, i) =>
    value === null
      ? []
      : [{ value, U: metricU[metric]?.[i] ?? null, URepeat: metricURepeat[metric]?.[i] ?? null }],
  )
}
