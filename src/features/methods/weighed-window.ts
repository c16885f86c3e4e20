import type { MetricKey } from '../../../shared/mechanics/catalogue.ts'
import { chooseWindow } from '../../../shared/mechanics/events/weighing.ts'
import { defaultSettings } from '../../../shared/mechanics/settings.ts'
import type { TraceSpan } from '../../charts/trial-trace/trace-data.ts'
import { zeroedSignal } from '../trials/zeroed-signal.ts'
import type { WorkedExample } from './worked-example.ts'

/** Figures that are read from the weighing, before anything moves. */
const weighed: readonly MetricKey[] = [
  'bodyWeight',
  'systemWeight',
  'bodyMass',
  'weighingSpread',
  'stanceForce',
]

/** The stretch of quiet stance that the engine weighs the sample's athlete in; null for what is not read there. */
export function weighedWindow(example: WorkedExample, key: MetricKey): TraceSpan | null {
  const { onset } = example.analysis.events
  const signal = weighed.includes(key) ? zeroedSignal(example, example.samples) : null
  if (!signal || !onset) return null
  const stance = { from: 0, to: Math.floor(onset.timeS * signal.sampleRateHz) }
  const chosen = chooseWindow(signal.total, signal.sums, stance, signal.dt, defaultSettings)
  if (!chosen) return null
  const { from, to } = chosen.window
  return { startS: from * signal.dt, endS: (to - 1) * signal.dt, label: 'weighed here' }
}
