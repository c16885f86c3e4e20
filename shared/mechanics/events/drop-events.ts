import { integrateAround } from '../signal/anchored-motion.ts'
import type { Crossing } from './flank.ts'
import { movedTo, placeCrossing, placeLanding } from './landing-events.ts'
import {
  endOfVisit,
  restAfter,
  unwindFromFlight,
  unwindFromRest,
  type Rest,
  type RestSearch,
  type Unwound,
} from './rest.ts'
import { noEvents, type TrialEvents } from './trial-events.ts'
import { risesThroughZero } from './turning-points.ts'
import type { Stretch } from './unloaded.ts'
import type { Weighing } from './weighing.ts'

/** Where a drop is to be looked for. */
export interface DropSearch extends RestSearch {
  /** The empty plates before the first touch. */
  fall: Stretch
  /** Every time off the plates, in any order. */
  unloaded: readonly Stretch[]
}

/** A drop jump's flight, and whether the athlete came back onto the plates after it. */
export interface Rebound {
  flight: Stretch
  landed: boolean
}

/** The events of a drop jump: it has a first touch and a takeoff. */
export interface ReboundEvents extends TrialEvents {
  arrival: Crossing
  takeoff: Crossing
}

/** The events of a landing from a box: its first touch is the touchdown. */
export interface DropLandingEvents extends TrialEvents {
  touchdown: Crossing
}

export interface LocatedDrop<E extends TrialEvents> extends Unwound {
  weighing: Weighing | null
  events: E
}

/** The motion is integrated from so long before the first touch, s. */
const leadS = 0.02

function restOf(search: DropSearch, touchdown: Crossing): Rest | null {
  const { signal, unloaded } = search
  const to = endOfVisit(touchdown.position, unloaded, signal.length)
  return restAfter(search, touchdown, { from: Math.ceil(touchdown.position), to })
}

function startOf({ signal }: DropSearch, touch: Crossing): number {
  return Math.max(0, Math.floor(touch.position - leadS / signal.dt))
}

/** Without anything to go by every value of the motion is NaN. */
function unknownMotion({ signal, gravity }: DropSearch, first: number): Unwound {
  const anchor = { position: first, velocity: NaN }
  return {
    motion: integrateAround(signal.total, first, anchor, NaN, gravity, signal.dt),
    startVelocity: { value: NaN, u: NaN },
  }
}

/** Places the events of a drop jump and integrates backwards; `null` where arrival and takeoff do not follow. */
export function locateDropJump(
  search: DropSearch,
  { flight, landed }: Rebound,
): LocatedDrop<ReboundEvents> | null {
  const arrival = placeCrossing(search, 'arrival', search.fall.to)
  const takeoff = placeCrossing(search, 'takeoff', flight.from)
  if (!arrival || !takeoff || !(arrival.position < takeoff.position)) return null
  const touchdown = landed ? placeCrossing(search, 'touchdown', flight.to) : null
  const rest = touchdown && restOf(search, touchdown)
  const first = startOf(search, arrival)
  const unwound = rest
    ? unwindFromRest(search, first, rest)
    : touchdown
      ? unwindFromFlight(search, first, takeoff, touchdown)
      : unknownMotion(search, first)
  const { motion } = unwound
  const latest = Math.floor(takeoff.position)
  return {
    ...unwound,
    weighing: rest?.weighing ?? null,
    events: {
      ...noEvents,
      arrival,
      zeroVelocity: movedTo(search, 'zeroVelocity') ?? risesThroughZero(motion, arrival.position, latest),
      takeoff,
      touchdown,
      ...(touchdown && placeLanding(search, motion, touchdown, rest?.still ?? null)),
    },
  }
}

/** Places the events of a landing from a box and integrates backwards; `null` where there is no touchdown. */
export function locateDropLanding(search: DropSearch): LocatedDrop<DropLandingEvents> | null {
  const touchdown = placeCrossing(search, 'touchdown', search.fall.to)
  if (!touchdown) return null
  const rest = restOf(search, touchdown)
  const first = startOf(search, touchdown)
  const unwound = rest ? unwindFromRest(search, first, rest) : unknownMotion(search, first)
  return {
    ...unwound,
    weighing: rest?.weighing ?? null,
    events: {
      ...noEvents,
      touchdown,
      ...placeLanding(search, unwound.motion, touchdown, rest?.still ?? null),
    },
  }
}
