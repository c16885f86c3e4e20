import type { MetricGroup } from '../types.ts'

/** Every group of figures. */
export const allGroups: MetricGroup[] = [
  'weighing',
  'jump',
  'impulse',
  'push',
  'contact',
  'flight',
  'landing',
  'sides',
  'ledger',
]

/** All that rests on the jump: everything but the weighing. */
export const allButWeighing = allGroups.filter((group) => group !== 'weighing')

/** What only the time after takeoff can spoil. */
export const afterTakeoff: MetricGroup[] = ['flight', 'landing', 'ledger']
