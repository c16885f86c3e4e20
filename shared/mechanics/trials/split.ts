import { quietAround, steadiestWindow } from '../events/weighing.ts'
import type { Stretch, Unloaded } from '../events/unloaded.ts'
import type { Settings } from '../settings.ts'
import type { Signal } from '../signal/condition.ts'
import { meanOver } from '../signal/running-mean.ts'
import type { Protocol } from '../types.ts'
import { reaches, strongForce } from './strike.ts'

/** A time on the plates, with the time off them before and after it, and its flights. */
interface Visit extends Stretch {
  /** From and to: where the time off the plates before it begins, and where the one after it ends. On the plates: */
  onFrom: number
  onTo: number
  flights: Stretch[]
}

interface Trace {
  signal: Signal
  unloaded: Unloaded
  settings: Settings
}

function visitsOf(unloaded: Unloaded, length: number): Visit[] {
  const edges: Stretch[] = [{ from: 0, to: 0 }, ...unloaded.offPlate, { from: length, to: length }]
  const visits = edges.slice(1).map((after, i): Visit => {
    const before = edges[i]
    const flights = unloaded.flights.filter(({ from, to }) => from >= before.to && to <= after.from)
    return { from: before.from, to: after.to, onFrom: before.to, onTo: after.from, flights }
  })
  return visits.filter(({ onFrom, onTo }) => onTo > onFrom)
}

/** Quiet stance between a touchdown and the next takeoff, as long as it lasts; `null` where there is none. */
function quietBetween({ signal, unloaded, settings }: Trace, limits: Stretch): Stretch | null {
  const { total, sums, dt } = signal
  const width = Math.round(settings.quietBetweenS / dt)
  if (limits.to - limits.from < width) return null
  const from = steadiestWindow(total, limits.from, limits.to, width)
  const window = { from, to: from + width }
  const weight = meanOver(sums, window.from, window.to)
  const load = weight - unloaded.level
  let squares = 0
  for (let i = window.from; i < window.to; i++) squares += (total[i] - weight) ** 2
  const steady = Math.sqrt(squares / width) <= settings.steadinessFail * load
  if (!steady || !(load > (unloaded.stanceLevel - unloaded.level) / 2)) return null
  const block = Math.max(1, Math.round((4 * settings.noiseBlockS) / dt))
  return quietAround(sums, window, limits, weight, settings.onsetFraction * load, block)
}

/** Parts of a visit with one jump each, or one series of jumps without quiet stance between them. */
function partsOf(visit: Visit, trace: Trace): Stretch[] {
  const parts: Stretch[] = []
  let { from } = visit
  for (const [i, flight] of visit.flights.entries()) {
    const next = visit.flights[i + 1]
    if (!next) break
    const quiet = quietBetween(trace, { from: flight.to, to: next.from })
    if (!quiet) continue
    parts.push({ from, to: quiet.to })
    ;({ from } = quiet)
  }
  return [...parts, { from, to: visit.to }]
}

/** Whether a visit without a flight may be a trial: of a landing after a fall, or of a jump that came down beside the plates. */
function countsWithoutFlight(visit: Visit, trace: Trace, protocol: Protocol | null): boolean {
  const { signal, unloaded, settings } = trace
  const { onFrom, onTo } = visit
  const strong = strongForce(signal, unloaded, settings)
  const within = (from: number, to: number) => reaches(signal.total, strong, from, to)
  const fell = onFrom > visit.from && within(onFrom, onFrom + Math.round(settings.strikeS / signal.dt))
  if (protocol === 'dropLanding') return fell
  const pushStart = Math.max(onFrom, onTo - Math.round(settings.longestReboundS / signal.dt))
  return (protocol === null && fell) || (onTo < visit.to && within(pushStart, onTo))
}

/**
 * The parts of a recording that hold a trial each, in samples, in their order: cut where the athlete was off the
 * plates for longer than a flight, and in quiet stance between two flights, which belongs to both. Time off the
 * plates belongs to the trials before and after it. A recording of one trial is one part and whole.
 * @param protocol the test that was named, or null
 */
export function splitTrials(
  signal: Signal,
  unloaded: Unloaded,
  protocol: Protocol | null,
  settings: Settings,
): Stretch[] {
  const whole = { from: 0, to: signal.length }
  const trace = { signal, unloaded, settings }
  const visits = visitsOf(unloaded, signal.length)
  if (visits.length === 1 && visits[0].flights.length < 2) return [whole]
  const parts = visits.flatMap((visit) => {
    if (visit.flights.length > 0 && protocol !== 'dropLanding') return partsOf(visit, trace)
    return countsWithoutFlight(visit, trace, protocol) ? [{ from: visit.from, to: visit.to }] : []
  })
  return parts.length > 1 ? parts : [whole]
}
