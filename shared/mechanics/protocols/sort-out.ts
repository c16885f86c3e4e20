import { catalogue } from '../catalogue.ts'
import type { Measured } from '../metrics/measured.ts'
import type { Figure, Note, TrialAnalysis } from '../types.ts'
import type { Budget } from '../uncertainty/budget.ts'

/** Sorts outcomes into figures, what is missing, and notes on figures without uncertainty. */
export function sortOut(
  budget: Budget,
  outcomes: Measured,
): Pick<TrialAnalysis, 'metrics' | 'missing' | 'notes'> {
  const metrics: Record<string, Figure> = {}
  const missing: TrialAnalysis['missing'] = []
  const notes: Note[] = []
  for (const [key, outcome] of outcomes) {
    if ('missing' in outcome) missing.push({ key, reason: outcome.missing })
    else if (!Number.isFinite(outcome.quantity.value))
      missing.push({ key, reason: 'The trace gives no finite value for it.' })
    else {
      metrics[key] = budget.figure(outcome.quantity, outcome.withoutU !== undefined)
      if (outcome.withoutU !== undefined)
        notes.push({ code: 'no-uncertainty', sentence: `${catalogue[key].name}: ${outcome.withoutU}` })
    }
  }
  return { metrics, missing, notes }
}
