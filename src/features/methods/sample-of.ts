import { catalogue, type MetricKey } from '../../../shared/mechanics/catalogue.ts'
import type { CheckKey } from '../../../shared/mechanics/checks/check-definitions.ts'
import type { Protocol } from '../../../shared/mechanics/types.ts'

/** The test whose sample shows a metric: the countermovement jump where it has it. */
export function sampleOfMetric(key: MetricKey): Protocol {
  const { protocols } = catalogue[key]
  return protocols.includes('cmj') ? 'cmj' : (protocols[0] ?? 'cmj')
}

/** Checks that only some tests have. */
const ofOtherTests: Partial<Record<CheckKey, Protocol>> = {
  'side-agreement': 'slcmj',
  'other-foot-off': 'slcmj',
  'other-foot-landing': 'slcmj',
  'squat-dip': 'sj',
  'drop-height': 'dj',
  'plausible-rebound': 'dj',
  'hop-count': 'hops',
  'hops-counted': 'hops',
}

/** The test whose sample shows a check. */
export const sampleOfCheck = (key: CheckKey): Protocol => ofOtherTests[key] ?? 'cmj'
