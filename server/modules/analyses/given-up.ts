import type { MetricGroup } from '../../../shared/mechanics/types.ts'
import type { EngineSaid } from './analysis-form.ts'

const everything: MetricGroup[] = [
  'weighing',
  'jump',
  'impulse',
  'push',
  'flight',
  'landing',
  'sides',
  'ledger',
]

/** What stands in place of an analysis that ended badly at every try: no figure, and a failed check that says so. */
export const givenUp: EngineSaid = {
  events: {},
  metrics: {},
  sides: null,
  ledger: null,
  checks: [
    {
      key: 'analysis-failed',
      verdict: 'fail',
      affects: everything,
      measured: null,
      limit: null,
      unit: '',
      sentence: 'This recording could not be analysed after several tries; the fault is on our side.',
      remedy: 'Set the trial aside, or repeat the jump. The recording itself is kept.',
    },
  ],
  missing: [],
  notes: [],
}
