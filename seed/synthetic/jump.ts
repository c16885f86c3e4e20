import { bodyNoise } from './body-noise.ts'
import { designJump } from './jump-design.ts'
import type { JumpDesign } from './jump-design.ts'
import type { Motion } from './motion.ts'
import type { JumpOptions } from './options.ts'
import { defaultJump } from './options.ts'
import { seededRandom } from './random.ts'
import { softRise } from './pulses.ts'

/** A jump as it truly was: force and motion at any instant, free of every plate. */
export interface Jump {
  options: JumpOptions
  design: JumpDesign
  /** Motion of the body's centre; upward is positive, 0 is standing. */
  motion: Motion
  /** Total vertical force in newtons. */
  force: (timeS: number) => number
  /** Share of it under the left foot. */
  leftShare: (timeS: number) => number
  /** When the athlete leaves the plates after landing, or null. */
  stepOffS: number | null
}

/** Time in which weight goes over from one foot to the other between phases, s. */
const SHIFT_S = 0.06
/** Time in which the plates are left when stepping off, s. */
const STEP_OFF_S = 0.12

function leftShareOf({ shares }: JumpOptions, design: JumpDesign): Jump['leftShare'] {
  const lowest = lowestPoint(design)
  const steps = [
    { at: design.startS, by: shares.unweighting - shares.stance },
    { at: design.minimumVelocityS, by: shares.braking - shares.unweighting },
    { at: lowest, by: shares.propulsion - shares.braking },
    { at: (design.liftOffS + design.touchS) / 2, by: shares.landing - shares.propulsion },
    { at: design.restS, by: shares.stance - shares.landing },
  ].filter((step) => step.by !== 0)
  return (timeS) => {
    let share = shares.stance
    for (const { at, by } of steps) {
      const u = (timeS - at) / SHIFT_S + 0.5
      if (u > 0) share += by * (u >= 1 ? 1 : softRise.value(u))
    }
    return share
  }
}

function lowestPoint({ motion, minimumVelocityS, unloadingS }: JumpDesign): number {
  let [low, high] = [minimumVelocityS, unloadingS]
  for (let i = 0; i < 40; i++) {
    const middle = (low + high) / 2
    if (motion.velocity(middle) < 0) low = middle
    else high = middle
  }
  return low
}

/** A jump with its sway and heartbeat, which `seed` decides; options left out are the defaults. */
export function makeJump(given: Partial<JumpOptions> = {}, seed = 1): Jump {
  const options: JumpOptions = { ...defaultJump, ...given }
  const design = designJump(options)
  const noise = bodyNoise(options.body, options.massKg, design, seededRandom(seed))
  const own = design.motion
  const motion: Motion = {
    acceleration: (timeS) => own.acceleration(timeS) + noise.acceleration(timeS),
    velocity: (timeS) => own.velocity(timeS) + noise.velocity(timeS),
    displacement: (timeS) => own.displacement(timeS) + noise.displacement(timeS),
  }
  const { massKg, gravity } = options
  const stepOffS = options.stepOffAfterS === null ? null : design.touchS + options.stepOffAfterS
  const force = (timeS: number): number => {
    if (timeS >= design.liftOffS && timeS <= design.touchS) return 0
    const onPlates = massKg * (gravity + motion.acceleration(timeS))
    if (stepOffS === null || timeS <= stepOffS) return onPlates
    return timeS >= stepOffS + STEP_OFF_S
      ? 0
      : onPlates * (1 - softRise.value((timeS - stepOffS) / STEP_OFF_S))
  }
  return { options, design, motion, force, leftShare: leftShareOf(options, design), stepOffS }
}
