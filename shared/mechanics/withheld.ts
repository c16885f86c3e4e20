import { catalogue, type MetricKey } from './catalogue.ts'
import type { TrialCheck } from './types.ts'

/**
 * Keys of the metrics that a failed check takes away: those of the groups it affects. They stay out of means,
 * trends and flags, and are shown as withheld. A key that the catalogue no longer knows is withheld where
 * anything failed, since nothing can be said for it.
 */
export function withheldMetrics(analysis: {
  metrics: Readonly<Record<string, unknown>>
  checks: readonly TrialCheck[]
}): string[] {
  const failed = analysis.checks.filter((check) => check.verdict === 'fail')
  if (failed.length === 0) return []
  const groups = new Set(failed.flatMap((check) => check.affects))
  return Object.keys(analysis.metrics).filter((key) => {
    const group = Object.hasOwn(catalogue, key) ? catalogue[key as MetricKey].group : null
    return group === null || groups.has(group)
  })
}
