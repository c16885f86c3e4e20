import type { TrialModel } from '../metrics/trial-model.ts'
import type { TrialCheck } from '../types.ts'
import { check } from './check.ts'

/** A series has at least as many contacts as its score is the mean of; the published test has ten. */
function enoughHops({ settings }: TrialModel, hops: number): TrialCheck {
  const { fewestContacts: fewest, contactsConsidered: wanted } = settings
  return check(
    'hop-count',
    hops < fewest ? 'fail' : hops < wanted ? 'caution' : 'pass',
    { measured: hops, limit: hops < fewest ? fewest : wanted, unit: 'hops' },
    {
      pass: `There are ${hops} hops in the series.`,
      caution: `There are only ${hops} hops in the series; the published test has ${wanted}.`,
      fail: `There are only ${hops} hops in the series; at least ${fewest} are needed.`,
    },
  )
}

/** Contacts that are too long are no rebounds and do not count. */
function enoughCounted({ settings }: TrialModel, hops: number, counted: number): TrialCheck {
  const { bestContacts: fewest, contactsConsidered, longestCountedContactS } = settings
  const considered = Math.min(hops, contactsConsidered)
  const limitMs = Math.round(1000 * longestCountedContactS)
  return check(
    'hops-counted',
    counted < fewest ? 'fail' : counted < considered ? 'caution' : 'pass',
    { measured: counted, limit: counted < fewest ? fewest : considered, unit: 'hops' },
    {
      pass: `All of the first ${considered} hops count.`,
      caution: `${considered - counted} of the first ${considered} hops do not count: the feet were on the ground for more than ${limitMs} ms.`,
      fail: `Only ${counted} of the first ${considered} hops count: in the others the feet were on the ground for more than ${limitMs} ms.`,
    },
  )
}

/** Checks of a series of hops. */
export function hopChecks(model: TrialModel, hops: number, counted: number): TrialCheck[] {
  return [enoughHops(model, hops), enoughCounted(model, hops, counted)]
}
