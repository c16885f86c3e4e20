import { motionOf } from './motion.ts'
import type { Component, Motion } from './motion.ts'
import type { JumpOptions, LandingShape, PushShape } from './options.ts'
import { earlyPeak, latePeak, raisedCosine, softRise, steepEnd, steepStart } from './pulses.ts'
import type { Pulse } from './pulses.ts'

/** A countermovement jump as a motion, and the instants at which its parts meet, in seconds. */
export interface JumpDesign {
  motion: Motion
  startS: number
  minimumVelocityS: number
  /** The total force begins to go from weight to zero. */
  unloadingS: number
  /** The total force reaches zero. */
  liftOffS: number
  /** The total force leaves zero. */
  touchS: number
  landingEndS: number
  /** The body is back in standing. */
  restS: number
}

/** A pulse's place within its phase, as fractions of the phase's width. */
interface Part {
  pulse: Pulse
  from: number
  width: number
  weight: number
}

const whole = (pulse: Pulse): Part[] => [{ pulse, from: 0, width: 1, weight: 1 }]

const PUSHES: Record<PushShape, Part[]> = {
  even: whole(raisedCosine),
  early: whole(earlyPeak),
  late: whole(latePeak),
  twoHumps: [
    { pulse: raisedCosine, from: 0, width: 0.7, weight: 1 },
    { pulse: latePeak, from: 0.35, width: 0.65, weight: 0.8 },
  ],
}

const LANDINGS: Record<LandingShape, Part[]> = {
  onePeak: whole(raisedCosine),
  twoPeaks: [
    { pulse: raisedCosine, from: 0.02, width: 0.24, weight: 0.75 },
    { pulse: earlyPeak, from: 0.08, width: 0.92, weight: 1 },
  ],
}

/** The rise to standing begins before the landing ends, so that the deepest point is passed and not settled in. */
const RISE_OVERLAP = 0.25

function place(parts: Part[], start: number, width: number, amplitude: number): Component[] {
  return parts.map((part) => ({
    pulse: part.pulse,
    start: start + part.from * width,
    width: part.width * width,
    amplitude: amplitude * part.weight,
  }))
}

/** Change of velocity that parts of amplitude 1 give over a phase of width 1. */
const areaOf = (parts: Part[]): number =>
  parts.reduce((sum, part) => sum + part.weight * part.width * part.pulse.area(1), 0)

interface Push {
  components: Component[]
  minimumVelocityS: number
  unloadingS: number
  liftOffS: number
}

/** The push whose dip has the downward acceleration `dip` and that leaves at the wanted velocity. */
function pushWith(options: JumpOptions, dip: number): Push {
  const { stanceS, unweightingS, pushS, unloadingS, gravity, takeoffVelocity } = options
  const unload = options.takeoffEdge === 'steep' ? steepEnd : softRise
  const parts = PUSHES[options.push]
  const lostInDip = dip * unweightingS * raisedCosine.area(1)
  const lostInUnloading = gravity * unloadingS * unload.area(1)
  const upward = (takeoffVelocity + lostInDip + lostInUnloading) / (pushS * areaOf(parts))
  const minimumVelocityS = stanceS + unweightingS
  const unloading = minimumVelocityS + pushS
  return {
    components: [
      { pulse: raisedCosine, start: stanceS, width: unweightingS, amplitude: -dip },
      ...place(parts, minimumVelocityS, pushS, upward),
      { pulse: unload, start: unloading, width: unloadingS, amplitude: -gravity },
    ],
    minimumVelocityS,
    unloadingS: unloading,
    liftOffS: unloading + unloadingS,
  }
}

function depthOf(push: Push): number {
  const motion = motionOf(push.components)
  let [low, high] = [push.minimumVelocityS, push.unloadingS]
  for (let i = 0; i < 50; i++) {
    const middle = (low + high) / 2
    if (motion.velocity(middle) < 0) low = middle
    else high = middle
  }
  return -motion.displacement(low)
}

/** Greatest downward acceleration of a dip, as a fraction of g: the feet stay loaded. */
const DEEPEST_DIP = 0.93

/** The push of the wanted depth: the dip's acceleration by bisection, at most what keeps the feet loaded. */
function designPush(options: JumpOptions): Push {
  let [low, high] = [0.05 * options.gravity, DEEPEST_DIP * options.gravity]
  for (let i = 0; i < 30; i++) {
    const middle = (low + high) / 2
    if (depthOf(pushWith(options, middle)) < options.depthM) low = middle
    else high = middle
  }
  return pushWith(options, (low + high) / 2)
}

/** Landing at rest, then rising to displacement 0 by two opposite pulses that leave no velocity. */
function designLanding(
  options: JumpOptions,
  push: Push,
): Omit<JumpDesign, 'startS' | 'minimumVelocityS' | 'unloadingS' | 'liftOffS'> {
  const { gravity, landingS, risingS, landsLowerM } = options
  const { liftOffS } = push
  const velocity = options.takeoffVelocity
  const flightS = (velocity + Math.sqrt(velocity ** 2 + 2 * gravity * landsLowerM)) / gravity
  const touchS = liftOffS + flightS
  const rise = options.touchdownEdge === 'steep' ? steepStart : softRise
  const parts = LANDINGS[options.landing]
  const gainedByRise = gravity * landingS * rise.area(1)
  const amplitude =
    (gravity * flightS - velocity + gravity * landingS - gainedByRise) / (landingS * areaOf(parts))
  const landing: Component[] = [
    ...push.components,
    { pulse: rise, start: touchS, width: landingS, amplitude: gravity },
    ...place(parts, touchS, landingS, amplitude),
  ]
  const landingEndS = touchS + landingS
  const half = risingS / 2
  const risingFrom = landingEndS - RISE_OVERLAP * landingS
  const reached = motionOf(landing).displacement(landingEndS)
  // Two opposite sin² pulses of width T and amplitude a lift by a·T²/2.
  const lift = (-2 * reached) / half ** 2
  const components = [
    ...landing,
    { pulse: raisedCosine, start: risingFrom, width: half, amplitude: lift },
    { pulse: raisedCosine, start: risingFrom + half, width: half, amplitude: -lift },
  ]
  return { motion: motionOf(components), touchS, landingEndS, restS: risingFrom + risingS }
}

/** A jump from the options alone, in closed form. */
export function designJump(options: JumpOptions): JumpDesign {
  const push = designPush(options)
  const { minimumVelocityS, unloadingS, liftOffS } = push
  return { startS: options.stanceS, minimumVelocityS, unloadingS, liftOffS, ...designLanding(options, push) }
}
