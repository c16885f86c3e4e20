import { findUnloaded, type Stretch, type Unloaded } from './events/unloaded.ts'
import { protocolNames } from './protocols/names.ts'
import type { NoTrial } from './protocols/protocol.ts'
import { protocolTable } from './protocols/table.ts'
import { defaultSettings, type Settings } from './settings.ts'
import { conditionRecording, type Signal } from './signal/condition.ts'
import { cutRecording } from './trials/cut-recording.ts'
import { proposeTest } from './trials/propose-test.ts'
import { movedWithin, shiftTrial } from './trials/shift-trial.ts'
import { splitTrials } from './trials/split.ts'
import type { AnalyseOptions, Note, Protocol, Recording, RecordingAnalysis, TrialAnalysis } from './types.ts'
import { engineVersion } from './version.ts'

const noFlight: Note = {
  code: 'no-trial-found',
  sentence: 'No flight was found: the force never falls to that of empty plates.',
}

/** A recording whose plates were read, and where they are loaded and empty. */
interface Prepared {
  recording: Recording
  signal: Signal
  unloaded: Unloaded
}

function prepare(recording: Recording, settings: Settings): Prepared | NoTrial {
  const conditioned = conditionRecording(recording, settings)
  if ('problem' in conditioned) return conditioned.problem
  const { signal } = conditioned
  const unloaded = findUnloaded(signal.total, signal.sums, signal.dt, settings)
  return unloaded ? { recording, signal, unloaded } : noFlight
}

function analyseTrial(
  prepared: Prepared,
  options: AnalyseOptions,
  settings: Settings,
): TrialAnalysis | NoTrial {
  const test = options.test ?? proposeTest(prepared.signal, prepared.unloaded, options.known ?? {}, settings)
  const analyseAs = protocolTable[test.protocol]
  if (!analyseAs)
    return { code: 'test-unknown', sentence: `The engine does not analyse the test “${test.protocol}”.` }
  return analyseAs({ ...prepared, test, options, settings })
}

/** A part of a recording is analysed as a recording of its own: so its cut, stored alone, gives the same figures. */
function analysePart(
  recording: Recording,
  part: Stretch,
  options: AnalyseOptions,
  settings: Settings,
): TrialAnalysis | NoTrial {
  const dt = 1 / recording.sampleRateHz
  const prepared = prepare(cutRecording(recording, part), settings)
  if ('code' in prepared) return prepared
  const movedEvents = movedWithin(options.movedEvents, part.from * dt, (part.to - 1) * dt)
  const outcome = analyseTrial(prepared, { ...options, ...(movedEvents && { movedEvents }) }, settings)
  return 'test' in outcome ? shiftTrial(outcome, part.from, dt) : outcome
}

function leftOut({ sentence }: NoTrial, { from, to }: Stretch, dt: number): Note {
  const span = `From ${(from * dt).toFixed(1)} to ${(to * dt).toFixed(1)} s`
  return { code: 'part-left-out', sentence: `${span} no trial was found. ${sentence}` }
}

function analyseAll(
  recording: Recording,
  options: AnalyseOptions,
  settings: Settings,
): Pick<RecordingAnalysis, 'trials' | 'notes'> {
  const whole = prepare(recording, settings)
  if ('code' in whole) return { trials: [], notes: [whole] }
  const { signal, unloaded } = whole
  const parts = splitTrials(signal, unloaded, options.test?.protocol ?? null, settings)
  if (parts.length === 1) {
    const outcome = analyseTrial(whole, options, settings)
    return 'test' in outcome ? { trials: [outcome], notes: [] } : { trials: [], notes: [outcome] }
  }
  const outcomes = parts.map((part) => analysePart(recording, part, options, settings))
  const notes = outcomes.flatMap((outcome, i) =>
    'test' in outcome ? [] : [leftOut(outcome, parts[i], signal.dt)],
  )
  const trials = outcomes.filter((outcome) => 'test' in outcome)
  const [first] = outcomes.filter((outcome) => 'code' in outcome)
  return { trials, notes: trials.length === 0 && first ? [first] : notes }
}

function proposals(trials: readonly TrialAnalysis[]): Note[] {
  const said = (protocol: Protocol): Note => ({
    code: 'test-proposed',
    sentence: `Taken for a ${protocolNames[protocol].toLowerCase()}, because no test was named.`,
  })
  return [...new Set(trials.map(({ test }) => test.protocol))].map(said)
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
  if (!(options.gravity > 0 && Number.isFinite(options.gravity))) {
    const sentence = 'The acceleration of free fall must be a positive number.'
    return { engineVersion, trials: [], notes: [...recording.notes, { code: 'gravity-unknown', sentence }] }
  }
  const { trials, notes } = analyseAll(recording, options, settings)
  const proposed = options.test ? [] : proposals(trials)
  return { engineVersion, trials, notes: [...recording.notes, ...notes, ...proposed] }
}
