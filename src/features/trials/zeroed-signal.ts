import type { Trial, Analysis } from '../../../shared/contracts/trials.ts'
import type { Stretch } from '../../../shared/mechanics/events/unloaded.ts'
import { zeroPlates } from '../../../shared/mechanics/events/zero.ts'
import { defaultSettings } from '../../../shared/mechanics/settings.ts'
import { conditionRecording, type Signal } from '../../../shared/mechanics/signal/condition.ts'
import { integrate } from '../../../shared/mechanics/signal/motion.ts'
import type { Samples } from '../../api/trials/read-samples.ts'

/** What of a trial its trace is drawn from. */
export type Traced = Pick<Trial, 'analysis'> & { recording: Pick<Trial['recording'], 'sampleRateHz'> }

/**
 * The forces as the engine takes them: turned the right way up and with the zero of the flight taken off each
 * plate. null where the recording holds no force to draw.
 */
export function zeroedSignal(trial: Traced, samples: Samples): Signal | null {
  const recording = {
    sampleRateHz: trial.recording.sampleRateHz,
    channels: samples,
    filledSamples: 0,
    timeBaseError: 0,
    notes: [],
  }
  const conditioned = conditionRecording(recording, defaultSettings)
  if (!('signal' in conditioned)) return null
  const { signal } = conditioned
  const empty = trial.analysis && emptyStretch(signal, trial.analysis)
  return empty ? zeroPlates(signal, empty, defaultSettings).signal : signal
}

/** So much of the empty plates before a fall gives their zero, s: as the engine takes it. */
const zeroingS = 1

/** The fall from a box, or the first flight: of hops that is the one before the first contact. */
function emptyStretch({ length, dt }: Signal, { events, contacts }: Analysis): Stretch | null {
  const { takeoff, touchdown } = events
  const fallen = fallenAt(events)
  if (fallen) {
    const longest = Math.round((zeroingS + 2 * defaultSettings.flightMarginS) / dt)
    return { from: Math.max(0, fallen.sample - longest), to: fallen.sample }
  }
  if (!takeoff) return null
  const hop = contacts?.[0]
  const to = hop ? Math.round(hop.touchdownS / dt) : (touchdown?.sample ?? length)
  return { from: takeoff.sample + 1, to }
}

/** Where a fall from a box ends; nothing of a jump from stance. */
const fallenAt = ({ arrival, takeoff, touchdown }: Analysis['events']) =>
  arrival ?? (takeoff ? undefined : touchdown)

/**
 * Momentum of the centre of mass, kg·m/s: since onset, or reckoned backwards from where the athlete stands still after
 * a fall. null where the trial was not weighed, or has neither.
 */
export function momentumOf(signal: Signal, analysis: Analysis): Float64Array | null {
  const weightN = analysis.metrics.systemWeight?.value
  const { onset, still } = analysis.events
  if (weightN === undefined) return null
  const mass = weightN / analysis.gravity
  const since = (startS: number) =>
    integrate(signal.total, startS * signal.sampleRateHz, weightN, analysis.gravity, signal.dt).velocity.map(
      (metresPerSecond) => metresPerSecond * mass,
    )
  if (onset) return since(onset.timeS)
  const fallen = fallenAt(analysis.events)
  return fallen && still ? backFrom(still.sample, fallen.sample, since(0)) : null
}

/** Shifts momentum to nothing at rest after a fall; before the fall the athlete was at rest on the box. */
function backFrom(restAt: number, fallenAt: number, momentum: Float64Array): Float64Array {
  const atRest = momentum[Math.min(restAt, momentum.length - 1)]!
  const shifted = momentum.map((value) => value - atRest)
  let first = fallenAt
  while (first > 0 && shifted[first - 1]! < 0) first--
  return shifted.fill(0, 0, first)
}
