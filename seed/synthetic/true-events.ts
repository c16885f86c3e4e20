import type { Span } from './lay-attempt.ts'
import { systemKg } from './options.ts'
import type { Trial } from './perform.ts'
import { firstZero, greatest, lastZero, least } from './search.ts'

/** Force of the definition of takeoff and touchdown, N. */
const CONTACT_N = 10
/** No force made here needs longer between zero and that. */
const EDGE_S = 0.2
/** Deviations from weight that are movement and that begin it, how long quiet lasts before it, and the lead. */
const ONSET = { movement: 0.1, deviation: 0.025, quietS: 0.1, leadS: 0.03 }

/** The instants of the definitions on the continuous, noise-free force. Seconds on the athlete's clock. */
export interface PushEvents {
  onset: number
  minimumForce: number
  minimumVelocity: number
  zeroVelocity: number
  takeoff: number
}

export interface ContactEvents {
  touchdown: number
  zeroVelocity: number
  takeoff: number
}

export interface LandingEvents {
  touchdown: number
  landingPeak: number
  landingZeroVelocity: number
}

export const weightOf = ({ athlete }: Trial): number => systemKg(athlete) * athlete.gravity

/** The force falls through 10 N for the last time before a flight. */
export function trueTakeoff({ force }: Trial, flight: Span): number {
  const takeoff = lastZero((timeS) => force(timeS) - CONTACT_N, flight.fromS, flight.fromS - EDGE_S)
  if (takeoff === null) throw new RangeError('Nothing was pushed off before the flight.')
  return takeoff
}

/** The force rises through 10 N for the first time after leaving zero at `touchS`. */
export function trueTouchdown({ force }: Trial, touchS: number): number {
  const touchdown = firstZero((timeS) => force(timeS) - CONTACT_N, touchS, touchS + EDGE_S)
  if (touchdown === null) throw new RangeError('Nothing was touched after the flight.')
  return touchdown
}

/**
 * 30 ms before the force leaves ±2.5 % of weight: backwards from the first deviation of 10 % that leads to the
 * flight, to the end of the last 100 ms that stayed within.
 */
export function trueOnset(trial: Trial, takeoff: number): number {
  const weight = weightOf(trial)
  const { fromS, startS } = trial.marks
  const within =
    (deviation: number) =>
    (timeS: number): number =>
      deviation * weight - Math.abs(trial.force(timeS) - weight)
  const inside = within(ONSET.deviation)
  let end = firstZero(within(ONSET.movement), startS ?? fromS, takeoff) ?? takeoff
  for (;;) {
    const leaves = lastZero(inside, end, fromS)
    if (leaves === null) throw new RangeError('The jump has no quiet stance before it.')
    const enters = lastZero(inside, leaves - 1e-9, fromS) ?? fromS
    if (inside(leaves - 1e-6) > 0 && leaves - enters >= ONSET.quietS) return leaves - ONSET.leadS
    end = leaves - 1e-6
  }
}

/** Of a push from stance with a dip. */
export function pushEvents(trial: Trial, flight: Span): PushEvents {
  const { motion, force } = trial
  const takeoff = trueTakeoff(trial, flight)
  const onset = trueOnset(trial, takeoff)
  const minimumVelocity = least(motion.velocity, onset, takeoff).timeS
  const zeroVelocity = firstZero(motion.velocity, minimumVelocity, takeoff) ?? takeoff
  const minimumForce = least(force, onset, zeroVelocity).timeS
  return { onset, minimumForce, minimumVelocity, zeroVelocity, takeoff }
}

/** Of a contact between two flights, or between a drop and a flight. */
export function contactEvents(trial: Trial, touchS: number, flight: Span): ContactEvents {
  const touchdown = trueTouchdown(trial, touchS)
  const takeoff = trueTakeoff(trial, flight)
  return { touchdown, zeroVelocity: firstZero(trial.motion.velocity, touchdown, takeoff) ?? takeoff, takeoff }
}

/** Of the landing in which the trial ends. */
export function landingEvents(trial: Trial): LandingEvents {
  const { flights, arrivalS, restS } = trial.marks
  const touchdown = trueTouchdown(trial, flights.at(-1)?.toS ?? arrivalS ?? NaN)
  const landingZeroVelocity = firstZero(trial.motion.velocity, touchdown, restS) ?? restS
  const landingPeak = greatest(trial.force, touchdown, landingZeroVelocity).timeS
  return { touchdown, landingPeak, landingZeroVelocity }
}
