import { eventWords } from '../../../shared/contracts/event-words.ts'
import type { Trial } from '../../../shared/contracts/trials.ts'
import { eventOrder } from '../../../shared/mechanics/events/event-order.ts'
import type { Signal } from '../../../shared/mechanics/signal/condition.ts'
import type { Samples } from '../../api/trials/read-samples.ts'
import type { TraceChannel, TraceData, TraceEvent } from '../../charts/trial-trace/trace-data.ts'
import { momentumOf, zeroedSignal, type Traced } from './zeroed-signal.ts'

/** What the trace of a trial is drawn from; null where the recording holds no force to draw. */
export function traceDataOf(trial: Traced & Pick<Trial, 'test'>, samples: Samples): TraceData | null {
  const signal = zeroedSignal(trial, samples)
  if (!signal) return null
  const { analysis } = trial
  return {
    sampleRateHz: signal.sampleRateHz,
    durationS: (signal.length - 1) * signal.dt,
    total: signal.total,
    feet: feetOf(signal),
    weight: weightOf(trial),
    momentum: analysis && momentumOf(signal, analysis),
    phases: phasesOf(trial),
    events: eventsOf(trial),
    overlays: [],
  }
}

/**
 * The ledger's entries. A fall is drawn as long as gravity needs for its impulse, so that its area is its impulse:
 * before it the plates are empty and the athlete is still on the box.
 */
function phasesOf({ analysis }: Pick<Trial, 'analysis'>): TraceData['phases'] {
  const weightN = analysis?.metrics.systemWeight?.value
  const entries = analysis?.ledger?.entries ?? []
  return entries.map((entry) => {
    if (entry.phase !== 'arrival' || !weightN) return entry
    const fallS = Math.abs(entry.netImpulse) / weightN
    return { ...entry, startS: Math.max(entry.startS, entry.endS - fallS) }
  })
}

function feetOf(signal: Signal): TraceChannel[] {
  return signal.plates.flatMap(({ channel, force }) =>
    channel === 'left' || channel === 'right' ? [{ key: channel, label: channel, values: force }] : [],
  )
}

function weightOf({ analysis, test }: Pick<Trial, 'analysis' | 'test'>): TraceData['weight'] {
  const weight = analysis?.metrics.systemWeight
  if (!weight) return null
  return { valueN: weight.value, label: test.externalLoadKg > 0 ? 'weight, loaded' : 'body weight' }
}

/** In the order in which they come. */
export function eventsOf({ analysis }: Pick<Trial, 'analysis'>): TraceEvent[] {
  return eventOrder
    .flatMap((name) => {
      const event = analysis?.events[name]
      if (!event) return []
      const adjusted = analysis?.movedEvents[name] !== undefined
      return [{ key: name, label: eventWords[name], timeS: event.timeS, ...(adjusted ? { adjusted } : {}) }]
    })
    .sort((a, b) => a.timeS - b.timeS)
}
