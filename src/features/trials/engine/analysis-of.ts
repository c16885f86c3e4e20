import type { Trial } from '../../../../shared/contracts/trials.ts'
import type { MovedEvents } from '../../../../shared/mechanics/events/event-order.ts'
import type { TrialAnalysis } from '../../../../shared/mechanics/types.ts'
import { withheldMetrics } from '../../../../shared/mechanics/withheld.ts'

export type Analysis = NonNullable<Trial['analysis']>

interface AnalysedBy {
  id: string
  engineVersion: string
  gravity: number
  movedEvents: MovedEvents
}

/** What the engine of this page says of a trial, in the form in which the server gives its own analyses. */
export function analysisOf(trial: TrialAnalysis, by: AnalysedBy): Analysis {
  const { events, contacts = null, metrics, sides, ledger, checks, missing, notes } = trial
  return {
    ...by,
    events,
    contacts,
    metrics,
    withheld: withheldMetrics(trial),
    sides,
    ledger,
    checks,
    missing,
    notes,
  }
}
