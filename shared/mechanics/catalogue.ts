import { contactMetrics } from './catalogue/contacts.ts'
import { forceMetrics } from './catalogue/force.ts'
import { impulseMetrics } from './catalogue/impulse.ts'
import { jumpMetrics } from './catalogue/jump.ts'
import { landingMetrics } from './catalogue/landing.ts'
import { pushMetrics } from './catalogue/push.ts'
import { sidesMetrics } from './catalogue/sides.ts'
import { squatMetrics } from './catalogue/squat.ts'
import { weighingMetrics } from './catalogue/weighing.ts'
import type { MetricDefinition } from './types.ts'

const definitions = {
  ...weighingMetrics,
  ...jumpMetrics,
  ...impulseMetrics,
  ...forceMetrics,
  ...pushMetrics,
  ...squatMetrics,
  ...contactMetrics,
  ...landingMetrics,
  ...sidesMetrics,
}

/** Stable name of a metric in data, code and exports. */
export type MetricKey = keyof typeof definitions

/** Every metric that the engine knows, by key. Nothing else names a metric. */
export const catalogue: Readonly<Record<MetricKey, MetricDefinition>> = definitions

/** The keys in the order in which screens and exports list them. */
export const metricKeys = Object.keys(definitions) as readonly MetricKey[]

/** Whether a word read from outside is a metric's key. */
export function isMetricKey(key: string): key is MetricKey {
  return Object.hasOwn(definitions, key)
}
