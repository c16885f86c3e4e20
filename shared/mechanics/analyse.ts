import { findUnloaded, type Stretch } from './events/unloaded.ts'
import type { NoTrial } from './protocols/protocol.ts'
import { protocolTable } from './protocols/table.ts'
import { defaultSettings, type Settings } from './settings.ts'
import { conditionRecording } from './signal/condition.ts'
import { cutRecording } from './trials/cut-recording.ts'
import { movedWithin, shiftTrial } from './trials/shift-trial.ts'
import { splitTrials } from './trials/split.ts'
import type { AnalyseOptions, Note, Recording, RecordingAnalysis, Test, TrialAnalysis } from './types.ts'
import { engineVersion } from './version.ts'

const proposed: Test = { protocol: 'cmj', side: 'both', externalLoadKg: 0, boxHeightM: null, arms: 'hips' }

const noFlight: Note = {
  code: 'no-trial-found',
  sentence: 'No flight was found: the force never falls to that of empty plates.',
}

/** The parts of a recording, each found loaded and unloaded, or the reason why there are none. */
function prepare(recording: Recording, settings: Settings) {
  const conditioned = conditionRecording(recording, settings)
  if ('problem' in conditioned) return conditioned
  const { signal } = conditioned
  const unloaded = findUnloaded(signal.total, signal.sums, signal.dt, settings)
  return unloaded ? { signal, unloaded } : { problem: noFlight }
}

/** A part of a recording that holds a trial is analysed as a recording of its own: so its cut gives the same figures. */
function analysePart(
  recording: Recording,
  { from, to }: Stretch,
  options: AnalyseOptions,
  settings: Settings,
): TrialAnalysis | NoTrial {
  const dt = 1 / recording.sampleRateHz
  const part = cutRecording(recording, { from, to })
  const prepared = prepare(part, settings)
  if ('problem' in prepared) return prepared.problem
  const movedEvents = movedWithin(options.movedEvents, from * dt, (to - 1) * dt)
  const outcome = analyseTrial(part, prepared, { ...options, movedEvents }, settings)
  return 'test' in outcome ? shiftTrial(outcome, from, dt) : outcome
}

function analyseTrial(
  recording: Recording,
  { signal, unloaded }: Exclude<ReturnType<typeof prepare>, { problem: Note }>,
  options: AnalyseOptions,
  settings: Settings,
): TrialAnalysis | NoTrial {
  const test = options.test ?? proposed
  const analyseAs = protocolTable[test.protocol]
  if (!analyseAs)
    return { code: 'test-unknown', sentence: `The engine does not analyse the test “${test.protocol}”.` }
  return analyseAs({ recording, signal, unloaded, test, options, settings })
}

function analyseAll(recording: Recording, options: AnalyseOptions, settings: Settings) {
  const whole = prepare(recording, settings)
  if ('problem' in whole) return [whole.problem]
  const parts = splitTrials(whole.signal, whole.unloaded, settings)
  return parts.length === 1
    ? [analyseTrial(recording, whole, options, settings)]
    : parts.map((part) => analysePart(recording, part, options, settings))
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
  if (!(options.gravity > 0 && Number.isFinite(options.gravity))) {
    notes.push({
      code: 'gravity-unknown',
      sentence: 'The acceleration of free fall must be a positive number.',
    })
    return { engineVersion, trials: [], notes }
  }
  const outcomes = analyseAll(recording, options, settings)
  const trials = outcomes.filter((outcome) => 'test' in outcome)
  if (trials.length === 0) notes.push(...outcomes.filter((outcome) => 'code' in outcome).slice(0, 1))
  else if (!options.test)
    notes.push({
      code: 'test-proposed',
      sentence: 'Taken for a countermovement jump, because no test was named.',
    })
  return { engineVersion, trials, notes }
}
