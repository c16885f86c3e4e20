import { completeAttempt } from './attempts.ts'
import type { GivenAttempt, SyntheticProtocol } from './attempts.ts'
import { bodyNoise } from './body-noise.ts'
import { motionOfCourse } from './course.ts'
import { fromBox } from './lay-attempt.ts'
import type { TrialMarks } from './lay-attempt.ts'
import type { Motion } from './motion.ts'
import { defaultAthlete, systemKg } from './options.ts'
import type { Athlete } from './options.ts'
import { seededRandom } from './random.ts'
import { sceneOf, stepOffOf } from './scene.ts'
import { stepsOf } from './steps.ts'

/** What the plates feel, free of every plate. */
export interface OnPlates {
  /** Total vertical force in newtons. */
  force: (timeS: number) => number
  /** Share of it under the left foot. */
  leftShare: (timeS: number) => number
  /** When feet strike the plates. */
  touchesS: readonly number[]
}

/** One trial as it truly was: force and motion at any instant. */
export interface Trial extends OnPlates {
  protocol: SyntheticProtocol
  side: 'both' | 'left' | 'right'
  athlete: Athlete
  boxHeightM: number | null
  /** Motion of the body's centre; upward is positive, 0 is standing. */
  motion: Motion
  marks: TrialMarks
  /** When the athlete leaves the plates in or after the landing, or null. */
  stepOffS: number | null
}

/** All that an athlete does in one recording. */
export interface Performance extends OnPlates {
  motion: Motion
  trials: readonly Trial[]
  /** Instants at which the motion's parts meet. */
  jointsS: readonly number[]
  /** The last quiet stance ends. */
  endS: number
}

/** Time in which weight goes over from one foot to the other between phases, s. */
const SHIFT_S = 0.06

function unite(own: Motion, noise: Motion): Motion {
  return {
    acceleration: (timeS) => own.acceleration(timeS) + noise.acceleration(timeS),
    velocity: (timeS) => own.velocity(timeS) + noise.velocity(timeS),
    displacement: (timeS) => own.displacement(timeS) + noise.displacement(timeS),
  }
}

/**
 * The attempts one after the other in one recording, with the sway and heartbeat that `seed` decides. The quiet
 * stance after one is followed by that before the next, on the plates or after some time beside them.
 */
export function perform(given: Partial<Athlete>, attempts: readonly GivenAttempt[], seed = 1): Performance {
  const athlete = { ...defaultAthlete, ...given }
  const { gravity } = athlete
  const massKg = systemKg(athlete)
  const all = attempts.map(completeAttempt)
  const [first] = all
  if (!first) throw new RangeError('An athlete who does nothing has no motion.')
  const scene = sceneOf(all, gravity)
  const unrest = { atFirst: fromBox(first) ? 0 : 1, fades: scene.fades } as const
  const motion = unite(
    motionOfCourse(scene.course),
    bodyNoise(athlete.body, massKg, unrest, seededRandom(seed)),
  )
  const support = stepsOf(1, scene.support)
  const { unloaded } = scene
  const force = (timeS: number): number => {
    for (const { fromS, toS } of unloaded) if (timeS >= fromS && timeS <= toS) return 0
    const carried = support(timeS)
    return carried === 0 ? 0 : carried * massKg * (gravity + motion.acceleration(timeS))
  }
  const leftShare = stepsOf(
    scene.shares[0]?.to ?? 0.5,
    scene.shares.map(({ atS, to }) => ({ atS: atS - SHIFT_S / 2, widthS: SHIFT_S, to })),
  )
  const touchesS = scene.marks.flatMap(({ arrivalS, flights }) => [
    ...(arrivalS === null ? [] : [arrivalS]),
    ...flights.map(({ toS }) => toS),
  ])
  const onPlates = { force, leftShare, touchesS, motion }
  const trials = scene.marks.map((marks, i): Trial => {
    const attempt = all[i] ?? first
    const boxHeightM = fromBox(attempt) ? attempt.boxHeightM : null
    const { protocol, side } = attempt
    return { ...onPlates, protocol, side, athlete, boxHeightM, marks, stepOffS: stepOffOf(marks, attempt) }
  })
  return { ...onPlates, trials, jointsS: scene.course.jointsS, endS: scene.course.timeS }
}
