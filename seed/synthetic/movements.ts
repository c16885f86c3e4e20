import { beginAt, endOf, goOn, motionOfCourse, shiftPulses } from './course.ts'
import type { Course } from './course.ts'
import { motionOf } from './motion.ts'
import type { Component } from './motion.ts'
import type { ContactOptions, DipOptions, LandingOptions, PushOptions, SquatPushOptions } from './options.ts'
import { raisedCosine, softRise, steepEnd, steepStart } from './pulses.ts'
import { zeroBetween } from './search.ts'
import { areaOf, contactParts, landingParts, place, pushParts } from './shapes.ts'

/** A push from rest on the plates into the air. Instants in seconds. */
export interface Pushed {
  course: Course
  startS: number
  /** The push upward begins. */
  pushFromS: number
  /** The total force begins to go from weight to zero. */
  unloadingS: number
  /** The total force reaches zero. */
  liftOffS: number
}

interface Dip {
  /** Greatest downward acceleration, m/s²; 0 for none. */
  amplitude: number
  durationS: number
  /** Share of the dip after which the push begins. */
  pushesFrom: number
}

/** A push that leaves at the wanted velocity, after a dip or from rest. */
function layPush(course: Course, gravity: number, options: PushOptions, dip: Dip): Pushed {
  const { pushS, unloadingS, takeoffVelocity } = options
  const unload = options.takeoffEdge === 'steep' ? steepEnd : softRise
  const parts = pushParts[options.push]
  const lostInDip = dip.amplitude * dip.durationS * raisedCosine.area(1)
  const lostInUnloading = gravity * unloadingS * unload.area(1)
  const upward = (takeoffVelocity + lostInDip + lostInUnloading) / (pushS * areaOf(parts))
  const startS = course.timeS
  const dips: Component[] =
    dip.amplitude === 0
      ? []
      : [{ pulse: raisedCosine, start: startS, width: dip.durationS, amplitude: -dip.amplitude }]
  const dipped = goOn(course, dips.length === 0 ? 0 : dip.pushesFrom * dip.durationS, dips)
  const pushed = goOn(dipped, pushS, place(parts, dipped.timeS, pushS, upward))
  const unloading = { pulse: unload, start: pushed.timeS, width: unloadingS, amplitude: -gravity }
  const left = goOn(pushed, unloadingS, [unloading])
  return {
    course: left,
    startS,
    pushFromS: dipped.timeS,
    unloadingS: pushed.timeS,
    liftOffS: left.timeS,
  }
}

/** The deepest point of a push with a dip. */
export const lowestOf = ({ course, pushFromS, unloadingS }: Pushed): number =>
  zeroBetween(motionOfCourse(course).velocity, pushFromS, unloadingS)

/** Greatest downward acceleration of a dip, as a fraction of g: the feet stay loaded. */
const DEEPEST_DIP = 0.93

/** Dip and push of the wanted depth: the dip's acceleration by bisection, at most what keeps the feet loaded. */
export function counterMove(course: Course, gravity: number, options: PushOptions & DipOptions): Pushed {
  const dipOf = (amplitude: number) => ({ amplitude, durationS: options.unweightingS, pushesFrom: 1 })
  const depthOf = (amplitude: number): number => {
    const pushed = layPush(beginAt(0), gravity, options, dipOf(amplitude))
    return -motionOfCourse(pushed.course).displacement(lowestOf(pushed))
  }
  let [low, high] = [0.05 * gravity, DEEPEST_DIP * gravity]
  for (let i = 0; i < 30; i++) {
    const middle = (low + high) / 2
    if (depthOf(middle) < options.depthM) low = middle
    else high = middle
  }
  return layPush(course, gravity, options, dipOf((low + high) / 2))
}

/** A small dip goes over into the push without a rest between them. */
const SQUAT_PUSHES_FROM = 0.75

/** A push out of the held squat, after a small dip or none. */
export function squatPush(course: Course, gravity: number, options: SquatPushOptions): Pushed {
  return layPush(course, gravity, options, {
    amplitude: options.dipFraction * gravity,
    durationS: options.dipS,
    pushesFrom: SQUAT_PUSHES_FROM,
  })
}

/** How far a push out of the squat lifts the body until the force reaches zero, m. */
export const squatTravel = (gravity: number, options: SquatPushOptions): number =>
  endOf(squatPush(beginAt(0), gravity, options).course).displacement

/** Flies until the body is `lowerM` under the height at which it left. */
export function fly(course: Course, gravity: number, lowerM: number): Course {
  const { velocity } = endOf(course)
  return goOn(course, (velocity + Math.sqrt(velocity ** 2 + 2 * gravity * lowerM)) / gravity)
}

/** Time in which a step off a box goes over into free fall, s. */
const STEP_DOWN_S = 0.15

/** Steps off a box and falls for as long as gives the speed of a free fall from `dropHeightM`. */
export function stepDown(course: Course, gravity: number, dropHeightM: number): Course {
  const fallS = Math.sqrt((2 * dropHeightM) / gravity) - STEP_DOWN_S * softRise.area(1)
  if (fallS < 0) throw new RangeError(`A drop of ${dropHeightM} m is over before the fall is free.`)
  const step = { pulse: softRise, start: course.timeS, width: STEP_DOWN_S, amplitude: -gravity }
  return goOn(course, STEP_DOWN_S + fallS, [step])
}

/** How far the body comes down in `stepDown`, m. */
export const stepDownDistance = (gravity: number, dropHeightM: number): number =>
  -endOf(stepDown(beginAt(0), gravity, dropHeightM)).displacement

/** From falling to flying in one contact: the parts' one amplitude in closed form, so the force never pulls. */
export function rebound(course: Course, gravity: number, options: ContactOptions): Course {
  const { contactS, takeoffVelocity } = options
  const parts = contactParts[options.contact]
  const gained = takeoffVelocity - endOf(course).velocity
  const amplitude = (gained + gravity * contactS) / (contactS * areaOf(parts))
  return goOn(course, contactS, place(parts, course.timeS, contactS, amplitude))
}

/** The rise to standing begins before the landing ends, so that the deepest point is passed and not settled in. */
const RISE_OVERLAP = 0.25

/** Falling to rest in `landingS`, then rising to displacement 0. */
export function land(
  course: Course,
  gravity: number,
  options: LandingOptions,
): { course: Course; landingEndS: number } {
  const { landingS, risingS } = options
  const touchS = course.timeS
  const rise = options.touchdownEdge === 'steep' ? steepStart : softRise
  const parts = landingParts[options.landing]
  const lost = gravity * landingS * (1 - rise.area(1)) - endOf(course).velocity
  const landing: Component[] = [
    { pulse: rise, start: touchS, width: landingS, amplitude: gravity },
    ...place(parts, touchS, landingS, lost / (landingS * areaOf(parts))),
  ]
  const landingEndS = touchS + landingS
  const risingFrom = landingEndS - RISE_OVERLAP * landingS
  const reached = motionOf([...course.components, ...landing], course.originM).displacement(landingEndS)
  const rising = shiftPulses(-reached, risingFrom, risingS)
  return {
    course: goOn(course, risingFrom + risingS - touchS, [...landing, ...rising]),
    landingEndS,
  }
}
