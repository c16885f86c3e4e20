import { allGroups } from '../../../shared/mechanics/checks/affected-groups.ts'
import type { Note, RecordingAnalysis } from '../../../shared/mechanics/types.ts'
import type { EngineSaid } from './analysis-form.ts'

/** An analysis without a figure, and the failed check that says why: a sheet never waits for what will not come. */
function withoutFigures(check: { key: string; sentence: string; remedy: string }, notes: Note[]): EngineSaid {
  return {
    events: {},
    metrics: {},
    sides: null,
    ledger: null,
    checks: [{ verdict: 'fail', affects: allGroups, measured: null, limit: null, unit: '', ...check }],
    missing: [],
    notes,
  }
}

/** What stands in place of an analysis that ended badly at every try. */
export const givenUp = withoutFigures(
  {
    key: 'analysis-failed',
    sentence: 'This recording could not be analysed after several tries; the fault is on our side.',
    remedy: 'Set the trial aside, or repeat the jump. The recording itself is kept.',
  },
  [],
)

/** The engine's answer for the one trial of a recording; one without a trial is kept and says so. */
export function ofOneTrial({ trials, notes }: RecordingAnalysis): EngineSaid {
  const [trial] = trials
  if (trial) return { ...trial, notes: [...notes, ...trial.notes] }
  const check = {
    key: 'no-trial-found',
    sentence: notes.at(-1)?.sentence ?? 'No jump was found in this recording.',
    remedy: 'Look at the trace. Set the trial aside if it holds no jump, and repeat the jump.',
  }
  return withoutFigures(check, notes)
}
