import type { Trial } from '../../../shared/contracts/trials.ts'
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
  const { takeoff, touchdown } = trial.analysis?.events ?? {}
  if (!takeoff) return signal
  const flight = { from: takeoff.sample + 1, to: touchdown?.sample ?? signal.length }
  return zeroPlates(signal, flight, defaultSettings).signal
}

/** Momentum of the centre of mass since onset, kg·m/s; null where the trial was not weighed. */
export function momentumOf(signal: Signal, analysis: NonNullable<Trial['analysis']>): Float64Array | null {
  const weightN = analysis.metrics.systemWeight?.value
  const onset = analysis.events.onset
  if (weightN === undefined || !onset) return null
  const { velocity } = integrate(
    signal.total,
    onset.timeS * signal.sampleRateHz,
    weightN,
    analysis.gravity,
    signal.dt,
  )
  const mass = weightN / analysis.gravity
  return velocity.map((metresPerSecond) => metresPerSecond * mass)
}
