import type { z } from 'zod'
import { headlineOf, massMetric, metricsOfTest } from '../../../shared/contracts/sheet-metrics.ts'
import type { Protocol } from '../../../shared/contracts/tests.ts'
import { isMetricKey, type MetricKey } from '../../../shared/mechanics/catalogue.ts'

type AnyProtocol = z.infer<typeof Protocol>

/** The metric that stands for a test where there is room for one. */
export const headlineMetric = (protocol: AnyProtocol): MetricKey => headlineOf(protocol) as MetricKey

/** The metrics of a test that have means, the one that stands for it first, the mass last. */
export function metricsOf(protocol: AnyProtocol): MetricKey[] {
  return [...metricsOfTest[protocol], massMetric].filter(isMetricKey)
}

/** The means that a sheet shows beside its trials, after the mass. */
export const sheetColumnsOf = (protocol: AnyProtocol): MetricKey[] => metricsOf(protocol).slice(0, 4)
