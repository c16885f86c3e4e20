import type { EventName, MetricGroup, Phase } from '../../../shared/mechanics/types.ts'

/** Those that stand on the trace; the table of the trace has them all. */
export const tracedEvents: readonly EventName[] = [
  'onset',
  'arrival',
  'zeroVelocity',
  'takeoff',
  'touchdown',
  'still',
]

export const phaseWords: Record<Phase, string> = {
  arrival: 'Arrival',
  unweighting: 'Unweighting',
  braking: 'Braking',
  propulsion: 'Propulsion',
  contact: 'Contact',
  flight: 'Flight',
  landing: 'Landing',
  settling: 'Settling',
}

/** Groups of metrics: heads of the measured figures, and what a check affects. */
export const groupWords: Record<MetricGroup, string> = {
  jump: 'Jump',
  push: 'Push',
  contact: 'Contact',
  flight: 'Flight',
  landing: 'Landing',
  impulse: 'Impulse',
  weighing: 'Weighing',
  ledger: 'Ledger',
  sides: 'Left and right',
}
