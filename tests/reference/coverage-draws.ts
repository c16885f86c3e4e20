import { beginAt, endOf } from '../../seed/synthetic/course.ts'
import { counterMove } from '../../seed/synthetic/movements.ts'
import type {
  BodyNoiseOptions,
  DipOptions,
  LandingOptions,
  LeftShares,
  PlateOptions,
  PushOptions,
  PushShape,
} from '../../seed/synthetic/options.ts'
import type { Random } from '../../seed/synthetic/random.ts'

/** m/s² */
export const gravity = 9.80665

/** Kinds of disturbance: none to speak of, white, autocorrelated, all at once, and behind the recorder's low-pass. */
export const noises = ['clean', 'white', 'slow', 'rough', 'filtered'] as const
export type Noise = (typeof noises)[number]

/** kg */
export const masses = {
  light: { from: 45, to: 60 },
  middle: { from: 60, to: 85 },
  heavy: { from: 85, to: 120 },
} as const

const pushes: readonly PushShape[] = ['even', 'early', 'late', 'twoHumps']
const edges = ['soft', 'steep'] as const

/** Expanded relative uncertainty (k = 2) of the plates' calibration: their gains are drawn from it. */
export const CALIBRATION_U = 0.005

/**
 * Sway of 1 to 3 mm/s and beats of 1 to 3 N are orders of magnitude of quiet standing (from memory); a still body
 * is for the clean stratum only.
 */
export function drawBody(noise: Noise, random: Random): BodyNoiseOptions {
  const isStill = noise === 'clean'
  return {
    swayVelocity: isStill ? 0.0003 : random.between(0.001, 0.003),
    heartbeatN: isStill ? 0 : random.between(1, 3),
    heartRateHz: random.between(0.9, 1.5),
    fidgetN: 0,
  }
}

export const drawGain = (random: Random): number => (CALIBRATION_U / 2) * random.normal()

export function drawPlate(noise: Noise, gainError: number, random: Random): Partial<PlateOptions> {
  const isRough = noise === 'rough'
  const ringing = {
    ringingN: random.between(5, 40),
    ringingHz: random.between(150, 400),
    ringingDecayS: 0.01,
  }
  const slowNoiseTimeS = random.between(0.01, 0.1)
  const byNoise: Record<Noise, () => Partial<PlateOptions>> = {
    clean: () => ({ whiteNoiseN: 0.3 }),
    white: () => ({ whiteNoiseN: random.between(0.8, 2.5), ...ringing }),
    slow: () => ({ whiteNoiseN: 0.5, slowNoiseN: random.between(0.5, 2), slowNoiseTimeS, ...ringing }),
    rough: () => ({
      whiteNoiseN: random.between(0.5, 2),
      slowNoiseN: random.between(0.5, 1.5),
      slowNoiseTimeS,
      ...ringing,
    }),
    filtered: () => ({ whiteNoiseN: random.between(0.8, 2.5), lowPassHz: 200, ...ringing }),
  }
  return {
    gainError,
    offsetN: isRough ? random.between(-5, 5) : 0,
    driftNPerS: isRough ? 0.1 * random.normal() : 0,
    stepN: isRough ? 0.2 : 0,
    ...byNoise[noise](),
  }
}

export function drawShares(random: Random): LeftShares {
  const share = (): number => random.between(0.46, 0.54)
  return {
    stance: share(),
    unweighting: share(),
    braking: share(),
    propulsion: share(),
    landing: share(),
  }
}

/**
 * @param speed at the first touch, m/s: the mean in the landing is about 0.6 of it, and so it takes some time to come
 * from the toes to below standing
 */
export const drawLanding = (random: Random, speed: number): LandingOptions => ({
  landing: random.pick(['onePeak', 'twoPeaks'] as const),
  touchdownEdge: random.pick(edges),
  landingS: random.between(Math.max(0.12, 0.2 / (0.6 * speed)), 0.27),
  risingS: random.between(0.8, 1.2),
})

const drawEdges = (random: Random) => ({
  unloadingS: random.between(0.03, 0.05),
  push: random.pick(pushes),
  takeoffEdge: random.pick(edges),
})

/**
 * A push out of the squat over 0.28 to 0.4 m (the mean velocity is about half the last one), which is then as long
 * as that takes.
 */
export const drawSquatPush = (random: Random, takeoffVelocity: number) => ({
  takeoffVelocity,
  pushS: random.between(0.55, 0.8) / takeoffVelocity,
  ...drawEdges(random),
})

/**
 * Dip and push of a countermovement: higher jumps from deeper dips, and a push as long as it takes to leave the
 * ground on the toes, 6 to 14 cm above standing.
 */
export function drawCounterMove(random: Random, takeoffVelocity: number): PushOptions & DipOptions {
  const options = {
    takeoffVelocity,
    depthM: 0.1 * takeoffVelocity + random.between(0.02, 0.1),
    unweightingS: random.between(0.36, 0.52),
    ...drawEdges(random),
  }
  const wantedM = random.between(0.06, 0.14)
  const heightOf = (pushS: number): number =>
    endOf(counterMove(beginAt(0), gravity, { ...options, pushS }).course).displacement
  // Secant steps: the height grows almost evenly with the time of the push.
  let [before, pushS] = [0.3, 0.35]
  let heightBefore = heightOf(before)
  for (let i = 0; i < 4; i++) {
    const height = heightOf(pushS)
    const next = pushS + ((wantedM - height) * (pushS - before)) / (height - heightBefore)
    ;[before, heightBefore, pushS] = [pushS, height, next]
  }
  return { ...options, pushS }
}
