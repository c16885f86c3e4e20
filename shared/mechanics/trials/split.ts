import { quietAround, steadiestWindow } from '../events/weighing.ts'
import type { Stretch, Unloaded } from '../events/unloaded.ts'
import type { Settings } from '../settings.ts'
import type { Signal } from '../signal/condition.ts'
import { meanOver } from '../signal/running-mean.ts'

/** A time on the plates, with the time off them before and after it, and its flights. */
interface Visit {
  /** Where the time off the plates before it begins, and where the one after it ends. */
  from: number
  to: number
  flights: Stretch[]
}

function visitsOf(unloaded: Unloaded, length: number): Visit[] {
  const edges: Stretch[] = [{ from: 0, to: 0 }, ...unloaded.offPlate, { from: length, to: length }]
  return edges.slice(1).map((after, i) => {
    const before = edges[i] as Stretch
    const flights = unloaded.flights.filter(({ from, to }) => from >= before.to && to <= after.from)
    return { from: before.from, to: after.to, flights }
  })
}

/** Quiet stance between a touchdown and the next takeoff, as long as it lasts; `null` where there is none. */
function quietBetween(signal: Signal, unloaded: Unloaded, limits: Stretch, settings: Settings) {
  const { total, sums, dt } = signal
  const width = Math.round(settings.weighingFailS / dt)
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
function partsOf(visit: Visit, signal: Signal, unloaded: Unloaded, settings: Settings): Stretch[] {
  const parts: Stretch[] = []
  let { from } = visit
  for (const [i, flight] of visit.flights.entries()) {
    const next = visit.flights[i + 1]
    if (!next) break
    const quiet = quietBetween(signal, unloaded, { from: flight.to, to: next.from }, settings)
    if (!quiet) continue
    parts.push({ from, to: quiet.to })
    ;({ from } = quiet)
  }
  return [...parts, { from, to: visit.to }]
}

/**
 * The parts of a recording that hold a trial each, in samples, in their order: cut where the athlete was off the
 * plates for longer than a flight, and in quiet stance between two flights, which belongs to both. A recording of
 * one trial is one part and whole.
 */
export function splitTrials(signal: Signal, unloaded: Unloaded, settings: Settings): Stretch[] {
  const whole = { from: 0, to: signal.length }
  const visits = visitsOf(unloaded, signal.length).filter(({ flights }) => flights.length > 0)
  const parts = visits.flatMap((visit) => partsOf(visit, signal, unloaded, settings))
  return parts.length > 1 ? parts : [whole]
}
