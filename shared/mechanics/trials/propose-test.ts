import type { Unloaded } from '../events/unloaded.ts'
import { steadiestWindow } from '../events/weighing.ts'
import type { Settings } from '../settings.ts'
import type { Signal } from '../signal/condition.ts'
import { meanAround, meanOver } from '../signal/running-mean.ts'
import type { Protocol, Side, Test } from '../types.ts'
import { reaches, strongForce } from './strike.ts'

/** What of a test is known without its name. */
export type KnownOfTest = Partial<Omit<Test, 'protocol'>>

interface Trace {
  signal: Signal
  unloaded: Unloaded
  settings: Settings
}

/** First sample on the plates where the trace begins off them with a fall; `null` where it does not. */
function landedFromAbove({ signal, unloaded, settings }: Trace): number | null {
  const [off] = unloaded.offPlate
  if (!off || off.from > 0 || off.to >= signal.length) return null
  const strong = strongForce(signal, unloaded, settings)
  const within = Math.round(settings.strikeS / signal.dt)
  return reaches(signal.total, strong, off.to, off.to + within) ? off.to : null
}

/** Whether the contacts between the flights follow one another as in hops. */
function isSeries({ signal, unloaded, settings }: Trace): boolean {
  const { flights } = unloaded
  if (flights.length < settings.fewestHopFlights) return false
  return flights.every(
    ({ from }, i) => i === 0 || from - flights[i - 1].to <= settings.longestReboundS / signal.dt,
  )
}

/** Mean force over the steadiest stance before the takeoff; the usual level where there is none. */
function stanceBefore({ signal, unloaded, settings }: Trace, from: number, takeoff: number): number {
  const width = Math.round(settings.quietBetweenS / signal.dt)
  if (takeoff - from < width) return unloaded.stanceLevel
  const start = steadiestWindow(signal.total, from, takeoff, width)
  return meanOver(signal.sums, start, start + width)
}

/** How far the force falls under the weight right before the push to the first flight, as a share of the weight. */
function dipBeforePush(trace: Trace): number {
  const { signal, unloaded, settings } = trace
  const { sums, dt } = signal
  const { from: takeoff } = unloaded.flights[0] ??
    unloaded.offPlate.find(({ from }) => from > 0) ?? { from: 0 }
  const start = unloaded.offPlate.filter(({ to }) => to <= takeoff).at(-1)?.to ?? 0
  const weight = stanceBefore(trace, start, takeoff)
  const load = weight - unloaded.level
  const half = Math.max(1, Math.round(settings.onsetSmoothingS / dt / 2))
  const share = (i: number) => (meanAround(sums, i, half) - weight) / load
  let i = takeoff
  while (i > start && share(i) < settings.movementFraction) i--
  while (i > start && share(i) > 0) i--
  const earliest = Math.max(start, i - settings.dipSearchS / dt)
  let least = i > start ? 0 : -1
  for (; i > earliest; i--) least = Math.min(least, share(i))
  return -least
}

/** The one plate of two that carries the athlete before the first flight; `null` where both do or there is one only. */
function loadedSide({ signal, unloaded, settings }: Trace): 'left' | 'right' | null {
  const [flight] = unloaded.flights
  const [a, b] = signal.plates
  if (!flight || !a || !b) return null
  const from = unloaded.offPlate.filter(({ to }) => to <= flight.from).at(-1)?.to ?? 0
  const carried = (force: Float64Array) =>
    mean(force, from, flight.from) - mean(force, flight.from, flight.to)
  const [left, right] = [carried(a.force), carried(b.force)]
  const share = Math.min(left, right) / (left + right)
  // A plate that reads the very same all that time is not empty but not connected, or stuck.
  const idle = left < right ? a : b
  if (!(share < settings.otherFootFail) || isConstant(idle.force, from, flight.to)) return null
  return left > right ? 'left' : 'right'
}

function mean(force: Float64Array, from: number, to: number): number {
  let sum = 0
  for (let i = from; i < to; i++) sum += force[i]
  return sum / Math.max(1, to - from)
}

function isConstant(force: Float64Array, from: number, to: number): boolean {
  for (let i = from + 1; i < to; i++) if (force[i] !== force[from]) return false
  return true
}

function protocolOf(trace: Trace, side: Side): Protocol {
  const { signal, unloaded, settings } = trace
  const arrival = landedFromAbove(trace)
  const [flight] = unloaded.flights
  if (isSeries(trace)) return 'hops'
  if (arrival !== null && !flight) return 'dropLanding'
  if (arrival !== null && flight && flight.from - arrival <= settings.longestReboundS / signal.dt) return 'dj'
  if (dipBeforePush(trace) < settings.proposedDip) return 'sj'
  return side === 'both' ? 'cmj' : 'slcmj'
}

/** The test that a trace looks like, with what is known of it. */
export function proposeTest(
  signal: Signal,
  unloaded: Unloaded,
  known: KnownOfTest,
  settings: Settings,
): Test {
  const trace = { signal, unloaded, settings }
  const side = known.side ?? loadedSide(trace) ?? 'both'
  return {
    externalLoadKg: 0,
    boxHeightM: null,
    arms: 'hips',
    ...known,
    protocol: protocolOf(trace, side),
    side,
  }
}
