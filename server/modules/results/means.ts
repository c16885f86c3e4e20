import type { MeanFigure } from '../../../shared/contracts/results.ts'
import { sheetMetrics } from '../../../shared/contracts/sheet-metrics.ts'
import { meanOfTrials, type TrialFigure } from '../../../shared/statistics/mean-of-trials.ts'
import type { GatheredResult } from './gather-results.ts'

type Columns = Pick<GatheredResult, 'metricValues' | 'metricU' | 'metricURepeat'>

/** Means of the metrics that a sheet and an athlete's page carry; one without a figure that counts is absent. */
export function meansOf(result: Columns): Record<string, MeanFigure> {
  const means: Record<string, MeanFigure> = {}
  for (const metric of sheetMetrics) {
    const mean = meanOfTrials(figuresOf(result, metric))
    if (mean) means[metric] = mean
  }
  return means
}

function figuresOf({ metricValues, metricU, metricURepeat }: Columns, metric: string): TrialFigure[] {
  return (metricValues[metric] ?? []).flatMap((value, i) =>
    value === null
      ? []
      : [{ value, U: metricU[metric]?.[i] ?? null, URepeat: metricURepeat[metric]?.[i] ?? null }],
  )
}
