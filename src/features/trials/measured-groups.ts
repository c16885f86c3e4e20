import type { Analysis } from '../../../shared/contracts/trials.ts'
import { catalogue, isMetricKey, metricKeys } from '../../../shared/mechanics/catalogue.ts'
import type { MetricDefinition, MetricGroup } from '../../../shared/mechanics/types.ts'
import { groupWords } from './event-words.ts'

export interface MeasuredFigure {
  metric: MetricDefinition
  figure: Analysis['metrics'][string]
  /** The failed check that takes it away; null for one that stands. */
  withheldBecause: string | null
}

/** All figures of an analysis by group, in the catalogue's order. */
export function measuredGroups(analysis: Pick<Analysis, 'metrics' | 'withheld' | 'checks'>) {
  const groups = Object.keys(groupWords) as MetricGroup[]
  return groups.flatMap((group) => {
    const figures = metricKeys.flatMap((key): MeasuredFigure[] => {
      const figure = analysis.metrics[key]
      const metric = catalogue[key]
      if (!figure || metric.group !== group) return []
      return [{ metric, figure, withheldBecause: withheldBecause(key, analysis) }]
    })
    return figures.length === 0 ? [] : [{ group, words: groupWords[group], figures }]
  })
}

/** The sentence of the failed check that takes a metric away. */
export function withheldBecause(
  key: string,
  { withheld, checks }: Pick<Analysis, 'withheld' | 'checks'>,
): string | null {
  if (!withheld.includes(key)) return null
  const group = isMetricKey(key) ? catalogue[key].group : null
  const check = checks.find(
    ({ verdict, affects }) => verdict === 'fail' && group !== null && affects.includes(group),
  )
  return check?.sentence ?? 'A failed check takes this figure away.'
}
