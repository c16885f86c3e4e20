import { recordingChecks, taredWithAthlete } from '../checks/recording-checks.ts'
import { restChecks } from '../checks/weighing-checks.ts'
import { ledgerOf } from '../ledger.ts'
import { reasons, type Measured } from '../metrics/measured.ts'
import type { TrialModel } from '../metrics/trial-model.ts'
import type { PhaseSpan } from '../phases.ts'
import type { Contact, Note, Sides, TrialAnalysis, TrialCheck } from '../types.ts'
import { eventsOut } from './events-out.ts'
import type { TrialInput } from './protocol.ts'
import { sortOut } from './sort-out.ts'

const tared: Note = {
  code: 'tared-with-athlete',
  sentence: 'The plates were set to zero with the athlete on them; the empty plates gave the true zero.',
}
const byRecordedMass: Note = {
  code: 'recorded-mass-used',
  sentence:
    'The athlete did not stand still after the landing: the recorded mass stands in for the weighing, and the takeoff velocity is that of the time in the air.',
}

/** What was made of a trial that is weighed in the quiet stance after its landing. */
export interface Outcome {
  model: TrialModel
  measured: Measured
  phases: readonly PhaseSpan[]
  sides: Sides | null
  contacts?: Contact[]
  /** Checks that only this test has, which may go by the figures. */
  checks: (figures: Pick<TrialAnalysis, 'metrics' | 'ledger'>) => TrialCheck[]
}

/** Puts together what leaves the engine of a trial that is weighed after its landing. */
export function trialOf(
  { recording, unloaded, test, options, settings }: TrialInput,
  outcome: Outcome,
): TrialAnalysis {
  const { model, measured, phases, sides, contacts } = outcome
  const { signal, zero, events, motion, weighing } = model
  const isWeightKnown = Number.isFinite(motion.systemWeight) && Number.isFinite(model.startVelocity.value)
  const { metrics, missing, notes } = sortOut(model.budget, measured)
  // Without a weight nothing of the motion is a number; other reasons would only be consequences.
  const because = isWeightKnown
    ? missing
    : missing.map((entry) =>
        entry.reason === reasons.noTouchdown ? entry : { ...entry, reason: reasons.noWeight },
      )
  const ledger = isWeightKnown && phases.length > 0 ? ledgerOf(model, phases, metrics.closingBalance) : null
  return {
    test,
    startS: 0,
    endS: (signal.length - 1) * signal.dt,
    events: eventsOut(events, signal.dt),
    ...(contacts && { contacts }),
    metrics,
    sides,
    ledger,
    checks: [
      ...recordingChecks(recording, signal, unloaded, zero, settings),
      ...restChecks(model, options),
      ...outcome.checks({ metrics, ledger }),
    ],
    missing: because,
    notes: [
      ...notes,
      ...(taredWithAthlete(unloaded, settings) ? [tared] : []),
      ...(isWeightKnown && !weighing ? [byRecordedMass] : []),
    ],
  }
}
