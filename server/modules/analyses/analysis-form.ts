import type { Analysis } from '../../../shared/contracts/trials.ts'
import type { TrialAnalysis } from '../../../shared/mechanics/types.ts'
import { withheldMetrics } from '../../../shared/mechanics/withheld.ts'
import type { AnalysisRow, NewAnalysis } from './analyses.queries.ts'

type StoredFigures = Pick<
  NewAnalysis,
  | 'events'
  | 'contacts'
  | 'metricValues'
  | 'metricUncertainties'
  | 'sides'
  | 'ledger'
  | 'checks'
  | 'missing'
  | 'notes'
>

/** What of the engine's answer is kept; the rest is of the trial itself. */
export type EngineSaid = Pick<
  TrialAnalysis,
  'events' | 'contacts' | 'metrics' | 'sides' | 'ledger' | 'checks' | 'missing' | 'notes'
>

/** What the engine said, as columns: values apart from uncertainties, so that reading one metric stays cheap. */
export function toRow(said: EngineSaid): StoredFigures {
  const { metrics, events, contacts = null, sides, ledger, checks, missing, notes } = said
  const figures = Object.entries(metrics)
  return {
    metricValues: Object.fromEntries(figures.map(([key, { value }]) => [key, value])),
    metricUncertainties: Object.fromEntries(
      figures.map(([key, { U, k, URepeat, kRepeat }]) => [key, [U, k, URepeat, kRepeat]]),
    ),
    events,
    contacts,
    sides,
    ledger,
    checks,
    missing,
    notes,
  }
}

/** The figures and verdicts of a stored analysis, as the engine gave them. */
export function figuresOf({
  metricValues,
  metricUncertainties,
  sides,
  checks,
}: Pick<AnalysisRow, 'metricValues' | 'metricUncertainties' | 'sides' | 'checks'>): Pick<
  EngineSaid,
  'metrics' | 'sides' | 'checks'
> {
  const metrics = Object.fromEntries(
    Object.entries(metricValues).map(([key, value]) => {
      const [U, k, URepeat, kRepeat] = metricUncertainties[key]
      return [key, { value, U, k, URepeat, kRepeat }]
    }),
  )
  return { metrics, sides, checks }
}

/** The analysis in the form that the API answers with. */
export function toView(row: AnalysisRow): Analysis {
  const { id, engineVersion, inputs, events, contacts, sides, ledger, checks, missing, notes } = row
  const { metrics } = figuresOf(row)
  return {
    id,
    engineVersion,
    gravity: inputs.gravity,
    events,
    contacts,
    movedEvents: inputs.movedEvents ?? {},
    metrics,
    withheld: withheldMetrics({ metrics, checks }),
    sides,
    ledger,
    checks,
    missing,
    notes,
  }
}
