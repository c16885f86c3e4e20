import type { AnalyseOptions, Note, Recording, RecordingAnalysis, Test } from './types.ts'
import { findUnloaded } from './events/unloaded.ts'
import { analyseCmj } from './protocols/cmj.ts'
import { defaultSettings, type Settings } from './settings.ts'
import { conditionRecording } from './signal/condition.ts'
import { engineVersion } from './version.ts'

const proposed: Test = { protocol: 'cmj', side: 'both', externalLoadKg: 0, boxHeightM: null, arms: 'hips' }

function none(notes: Note[]): RecordingAnalysis {
  return { engineVersion, trials: [], notes }
}

/**
 * The engine's front door: a recording in, its trials out, each with events, figures and their uncertainties, impulse
 * ledger and checks. Pure: the recording is not changed, and the same input gives the same output anywhere. It throws
 * nothing; what cannot be analysed comes back without trials and with a note that says why.
 */
export function analyse(
  recording: Recording,
  options: AnalyseOptions,
  settings: Settings = defaultSettings,
): RecordingAnalysis {
  const notes = [...recording.notes]
  if (!(options.gravity > 0 && Number.isFinite(options.gravity)))
    return none([
      ...notes,
      { code: 'gravity-unknown', sentence: 'The acceleration of free fall must be a positive number.' },
    ])
  const conditioned = conditionRecording(recording, settings)
  if ('problem' in conditioned) return none([...notes, conditioned.problem])
  const { signal } = conditioned
  const unloaded = findUnloaded(signal.total, signal.sums, signal.dt, settings)
  if (!unloaded)
    return none([
      ...notes,
      {
        code: 'no-trial-found',
        sentence: 'No flight was found: the force never falls to that of empty plates.',
      },
    ])
  const test = options.test ?? proposed
  if (!options.test)
    notes.push({
      code: 'test-proposed',
      sentence: 'Taken for a countermovement jump, because no test was named.',
    })
  const outcome = analyseCmj(recording, signal, unloaded, test, options, settings)
  if (!('test' in outcome)) return none([...notes, outcome])
  return { engineVersion, trials: [outcome], notes }
}
