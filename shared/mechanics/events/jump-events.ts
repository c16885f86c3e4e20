import type { AnalyseOptions, EventName } from '../types.ts'
import type { Settings } from '../settings.ts'
import { instantAt, integrate, type Motion } from '../signal/motion.ts'
import { findPeak, type Peak } from '../signal/peak.ts'
import { fitFlank, type Crossing } from './flank.ts'
import { findOnset, type Onset } from './onset.ts'
import { findStill } from './still.ts'
import {
  extremeVelocity,
  fallStops,
  placeWeightCrossing,
  risesThroughZero,
  type Placed,
} from './turning-points.ts'
import type { Stretch } from './unloaded.ts'
import { chooseWindow, staysChosen, weighIn, type Weighing } from './weighing.ts'
import type { Zero, ZeroedSignal } from './zero.ts'

/** The events of a countermovement jump and its landing, in samples; `null` where the record does not hold one. */
export interface JumpEvents {
  onset: Onset
  takeoff: Crossing
  minimumForce: Peak | null
  minimumVelocity: Placed | null
  zeroVelocity: number | null
  touchdown: Crossing | null
  landingPeak: Peak | null
  landingZeroVelocity: number | null
  still: number | null
}

export interface LocatedJump {
  weighing: Weighing
  motion: Motion
  events: JumpEvents
}

/** Where the jump is to be looked for. */
export interface JumpSearch {
  signal: ZeroedSignal
  zero: Zero
  /** First sample on the plates before the jump. */
  start: number
  flight: Stretch
  /** Whether the athlete came back onto the plates after the flight. */
  landed: boolean
  gravity: number
  moved: NonNullable<AnalyseOptions['movedEvents']>
  settings: Settings
}

/** A person's instant in place of the fitted one, as far as it lies in the record; it is sure to a sample. */
function movedTo({ moved, signal }: JumpSearch, name: EventName): number | null {
  const timeS = moved[name]
  if (timeS === undefined || !Number.isFinite(timeS)) return null
  return Math.max(0, Math.min(signal.length - 1, timeS * signal.sampleRateHz))
}

/** Standard uncertainty of an instant set by hand, samples: anywhere within one. */
const movedU = 0.5 / Math.sqrt(3)

function placeCrossing(search: JumpSearch, name: 'takeoff' | 'touchdown'): Crossing | null {
  const { signal, flight, zero, settings } = search
  const edge = name === 'takeoff' ? flight.from : flight.to
  const found = fitFlank(
    signal.total,
    edge,
    name === 'takeoff' ? 'falling' : 'rising',
    zero.total,
    signal.dt,
    settings,
  )
  const position = movedTo(search, name)
  if (position === null) return found
  return { position, positionU: movedU, slope: found?.slope ?? (name === 'takeoff' ? -1 : 1) }
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
  const { zero, signal, settings } = search
  const noDip = { minimumForce: null, minimumVelocity: null, zeroVelocity: null }
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
    minimumForce: findPeak(
      signal.total,
      onset,
      minimumVelocity.position,
      -1,
      zero.total,
      signal.dt,
      settings,
    ),
    minimumVelocity,
    zeroVelocity: zeroAt,
  }
}

function placeLandingEvents(search: JumpSearch, motion: Motion, touchdown: Crossing | null) {
  const { signal, zero, settings } = search
  if (!touchdown) return { landingPeak: null, landingZeroVelocity: null, still: null }
  const last = signal.length - 1
  const still =
    movedTo(search, 'still') ??
    findStill(signal.sums, motion.systemWeight, touchdown.position, signal.dt, settings)
  const stopsBefore = Math.floor(still ?? last)
  const landingZeroVelocity =
    movedTo(search, 'landingZeroVelocity') ??
    fallStops(motion, touchdown.position, stopsBefore, settings.closingFail)
  const end = landingZeroVelocity ?? Math.min(last, touchdown.position + settings.landingSearchS / signal.dt)
  return {
    landingPeak: findPeak(signal.total, touchdown.position, end, 1, zero.total, signal.dt, settings),
    landingZeroVelocity,
    still,
  }
}

/** Weighs, places every event and integrates; `null` where there is no takeoff or nothing to weigh. */
export function locateJump(search: JumpSearch): LocatedJump | null {
  const { signal, landed, gravity } = search
  const takeoff = placeCrossing(search, 'takeoff')
  if (!takeoff) return null
  const weighed = weighBeforeOnset(search, takeoff.position)
  if (!weighed || !(weighed.onset.position < takeoff.position)) return null
  const { weighing, onset } = weighed
  const motion = integrate(signal.total, onset.position, weighing.systemWeight, gravity, signal.dt)
  const touchdown = landed ? placeCrossing(search, 'touchdown') : null
  return {
    weighing,
    motion,
    events: {
      onset,
      takeoff,
      touchdown,
      ...placePushEvents(search, motion, onset.position, takeoff.position),
      ...placeLandingEvents(search, motion, touchdown),
    },
  }
}

/** Velocity at an event of the plates, where the force is the threshold's. */
export function velocityAtCrossing(motion: Motion, crossing: Crossing, settings: Settings) {
  return instantAt(motion, crossing.position, settings.eventForceN)
}
