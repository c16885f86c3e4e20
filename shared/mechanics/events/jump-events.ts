import type { Settings } from '../settings.ts'
import { instantAt, integrate, type Motion } from '../signal/motion.ts'
import type { Crossing } from './flank.ts'
import {
  movedTo,
  movedU,
  placeCrossing,
  placeLanding,
  placePeak,
  placeStill,
  type EventSearch,
} from './landing-events.ts'
import { findOnset, type Onset } from './onset.ts'
import { noEvents, type TrialEvents } from './trial-events.ts'
import { extremeVelocity, placeWeightCrossing, risesThroughZero } from './turning-points.ts'
import type { Stretch } from './unloaded.ts'
import { chooseWindow, staysChosen, weighIn, type Weighing } from './weighing.ts'

/** The events of a jump from stance and its landing: it has a beginning and a takeoff. */
export interface JumpEvents extends TrialEvents {
  onset: Onset
  takeoff: Crossing
}

export interface LocatedJump {
  weighing: Weighing
  motion: Motion
  events: JumpEvents
}

/** Where the jump is to be looked for. */
export interface JumpSearch extends EventSearch {
  /** First sample on the plates before the jump. */
  start: number
  flight: Stretch
  /** Whether the athlete came back onto the plates after the flight. */
  landed: boolean
  /** Whether the body goes down before the push. */
  dips: boolean
  gravity: number
}

/** Weighs and finds the onset; weighs again before it where the first weighing ran into the movement. */
function weighBeforeOnset(search: JumpSearch, takeoff: number): { weighing: Weighing; onset: Onset } | null {
  const { signal, zero, start, gravity, settings } = search
  const { total, sums, dt } = signal
  const attempt = (to: number) => {
    const chosen = chooseWindow(total, sums, { from: start, to }, dt, settings)
    if (!chosen || !(chosen.systemWeight > settings.smallestLoadN)) return null
    const limits = { earliest: start, takeoff: Math.floor(takeoff) }
    return { chosen, to, onset: findOnset(total, sums, chosen, limits, zero.total, dt, settings) }
  }
  const first = attempt(Math.floor(takeoff))
  if (!first) return null
  const end = Math.floor(first.onset.position)
  const last = staysChosen(first.chosen, end, dt, settings) ? { ...first, to: end } : (attempt(end) ?? first)
  const limits = { from: start, to: last.to }
  const position = movedTo(search, 'onset')
  return {
    weighing: weighIn(last.chosen, sums, limits, gravity, zero.total, dt, settings),
    onset: position === null ? last.onset : { ...last.onset, position, positionU: movedU },
  }
}

function placePushEvents(search: JumpSearch, motion: Motion, onset: number, takeoff: number) {
  const { zero, settings } = search
  const noDip = { minimumForce: null, minimumVelocity: null, zeroVelocity: null }
  if (!search.dips) return noDip
  const lowest = extremeVelocity(motion, onset, takeoff, -1)
  if (!(motion.velocity[lowest] < 0)) return noDip
  const moved = movedTo(search, 'minimumVelocity')
  const minimumVelocity =
    moved === null
      ? placeWeightCrossing(motion, lowest, zero.total, settings)
      : { position: moved, forceU: 0 }
  const zeroAt = movedTo(search, 'zeroVelocity') ?? risesThroughZero(motion, lowest, Math.floor(takeoff))
  // A dip of noise alone has its instants out of order, and nothing between them to measure.
  const lowestAt = minimumVelocity.position
  if (!(onset < lowestAt && lowestAt < (zeroAt ?? takeoff) && (zeroAt ?? onset) < takeoff)) return noDip
  return {
    minimumForce: placePeak(search, 'minimumForce', onset, minimumVelocity.position),
    minimumVelocity,
    zeroVelocity: zeroAt,
  }
}

/** Weighs, places every event and integrates; `null` where there is no takeoff or nothing to weigh. */
export function locateJump(search: JumpSearch): LocatedJump | null {
  const { signal, flight, landed, gravity } = search
  const takeoff = placeCrossing(search, 'takeoff', flight.from)
  if (!takeoff) return null
  const weighed = weighBeforeOnset(search, takeoff.position)
  if (!weighed || !(weighed.onset.position < takeoff.position)) return null
  const { weighing, onset } = weighed
  const motion = integrate(signal.total, onset.position, weighing.systemWeight, gravity, signal.dt)
  const touchdown = landed ? placeCrossing(search, 'touchdown', flight.to) : null
  return {
    weighing,
    motion,
    events: {
      ...noEvents,
      onset,
      takeoff,
      touchdown,
      ...placePushEvents(search, motion, onset.position, takeoff.position),
      ...(touchdown &&
        placeLanding(search, motion, touchdown, placeStill(search, motion.systemWeight, touchdown))),
    },
  }
}

/** Velocity at an event of the plates, where the force is the threshold's. */
export function velocityAtCrossing(motion: Motion, crossing: Crossing, settings: Settings) {
  return instantAt(motion, crossing.position, settings.eventForceN)
}
