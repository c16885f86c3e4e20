import { integrateAround } from '../signal/anchored-motion.ts'
import type { Motion } from '../signal/motion.ts'
import type { Crossing } from './flank.ts'
import { placeStill, type EventSearch } from './landing-events.ts'
import { weigh, type Weighing } from './weighing.ts'
import type { Stretch } from './unloaded.ts'

/** What the quiet stance after a landing says: the weight, and an instant at rest. */
export interface Rest {
  weighing: Weighing
  /** The first second of quiet stance; `null` where it lasts less. */
  still: number | null
  /** Where the body is taken to be at rest, samples. */
  position: number
}

/** What is to be known of a trial whose motion is not told by a stance before it. */
export interface RestSearch extends EventSearch {
  gravity: number
  /** The athlete's recorded mass with the external load, kg; `null` where none is recorded. */
  recordedKg: number | null
}

/** Weighs in the quiet stance after a landing; `null` where the athlete does not stand still within `limits`. */
export function restAfter(search: RestSearch, landing: Crossing, limits: Stretch): Rest | null {
  const { signal, zero, gravity, settings } = search
  const { total, sums, dt } = signal
  const { restInflationKept } = settings
  const weighing = weigh(total, sums, limits, gravity, zero.total, dt, settings, restInflationKept)
  if (!weighing || !(weighing.systemWeight > settings.smallestLoadN)) return null
  if (!(weighing.spread <= settings.steadinessFail * weighing.systemWeight)) return null
  const still = placeStill(search, weighing.systemWeight, landing)
  return { weighing, still, position: still ?? weighing.window.from }
}

/** Where the time on the plates after a touchdown ends: at the next time off them, or with the record. */
export function endOfVisit(touchdown: number, unloaded: readonly Stretch[], length: number): number {
  return unloaded.reduce((end, { from }) => (from > touchdown && from < end ? from : end), length)
}

/** The motion from `first` on, backwards from rest; the velocity where it starts, and how well that is known. */
export interface Unwound {
  motion: Motion
  startVelocity: { value: number; u: number }
}

/** Integrates backwards from the quiet stance after the landing. */
export function unwindFromRest(
  { signal, gravity, settings }: RestSearch,
  first: number,
  rest: Rest,
): Unwound {
  const anchor = { position: rest.position, velocity: 0 }
  return {
    motion: integrateAround(signal.total, first, anchor, rest.weighing.systemWeight, gravity, signal.dt),
    startVelocity: { value: 0, u: settings.swayVelocityChange / Math.SQRT2 },
  }
}

/**
 * Integrates both ways from a takeoff whose velocity the time in the air tells, with the recorded mass for weight. A
 * body that lands lower than it left flies longer, which widens the velocity's uncertainty. Without a recorded mass
 * every value of the motion is NaN, and so are the figures that rest on it.
 */
export function unwindFromFlight(
  { signal, gravity, recordedKg, settings }: RestSearch,
  first: number,
  takeoff: Crossing,
  touchdown: Crossing,
): Unwound {
  const { dt } = signal
  const flightS = (touchdown.position - takeoff.position) * dt
  const value = (gravity * flightS) / 2
  const u = Math.hypot(
    (gravity / 2) * Math.hypot(takeoff.positionU, touchdown.positionU) * dt,
    settings.flightLowerU / flightS,
  )
  const anchor = { position: takeoff.position, velocity: value }
  const weight = recordedKg === null ? NaN : recordedKg * gravity
  return {
    motion: integrateAround(signal.total, first, anchor, weight, gravity, dt),
    startVelocity: { value, u },
  }
}
