import { makeJump } from '../../seed/synthetic/jump.ts'
import type { Jump } from '../../seed/synthetic/jump.ts'
import type { BodyNoiseOptions, LandingShape, PlateOptions, PushShape } from '../../seed/synthetic/options.ts'
import { seededRandom } from '../../seed/synthetic/random.ts'
import type { Random } from '../../seed/synthetic/random.ts'
import { recordJump } from '../../seed/synthetic/record.ts'
import type { Recording } from '../../shared/mechanics/types.ts'

const RATES = [500, 1000, 2000] as const
const NOISES = ['clean', 'white', 'slow', 'rough'] as const
/** kg */
const MASSES = {
  light: { from: 45, to: 60 },
  middle: { from: 60, to: 85 },
  heavy: { from: 85, to: 120 },
} as const
const PUSHES: readonly PushShape[] = ['even', 'early', 'late', 'twoHumps']
const LANDINGS: readonly LandingShape[] = ['onePeak', 'twoPeaks']

type Noise = (typeof NOISES)[number]

/** Expanded relative uncertainty (k = 2) of the plates' calibration: their gains are drawn from it. */
export const CALIBRATION_U = 0.005

/** One drawn trial: what truly happened, what the plates wrote, and where it belongs. */
export interface CoverageTrial {
  jump: Jump
  recording: Recording
  /** By kind: rate, noise, mass, push, landing, plates. */
  strata: Record<string, string>
}

/**
 * Sway of 1 to 3 mm/s and beats of 1 to 3 N are orders of magnitude of quiet standing (from memory); a still body
 * is for the clean stratum only.
 */
function drawBody(noise: Noise, random: Random): BodyNoiseOptions {
  const isStill = noise === 'clean'
  return {
    swayVelocity: isStill ? 0.0003 : random.between(0.001, 0.003),
    heartbeatN: isStill ? 0 : random.between(1, 3),
    heartRateHz: random.between(0.9, 1.5),
    fidgetN: 0,
  }
}

function drawPlate(noise: Noise, random: Random): Partial<PlateOptions> {
  const gainError = (CALIBRATION_U / 2) * random.normal()
  const isRough = noise === 'rough'
  const ringing = {
    ringingN: random.between(5, 40),
    ringingHz: random.between(150, 400),
    ringingDecayS: 0.01,
  }
  const byNoise: Record<Noise, Partial<PlateOptions>> = {
    clean: { whiteNoiseN: 0.3 },
    white: { whiteNoiseN: random.between(0.8, 2.5), ...ringing },
    slow: {
      whiteNoiseN: 0.5,
      slowNoiseN: random.between(0.5, 2),
      slowNoiseTimeS: random.between(0.01, 0.1),
      ...ringing,
    },
    rough: {
      whiteNoiseN: random.between(0.5, 2),
      slowNoiseN: random.between(0.5, 1.5),
      slowNoiseTimeS: random.between(0.01, 0.1),
      ...ringing,
    },
  }
  return {
    gainError,
    offsetN: isRough ? random.between(-5, 5) : 0,
    driftNPerS: isRough ? 0.1 * random.normal() : 0,
    stepN: isRough ? 0.2 : 0,
    ...byNoise[noise],
  }
}

/** The trial of a number: always the same one. */
export function coverageTrial(number: number): CoverageTrial {
  const random = seededRandom(77_000 + number)
  const rate = random.pick(RATES)
  const noise = random.pick(NOISES)
  const mass = random.pick(['light', 'middle', 'heavy'] as const)
  const push = random.pick(PUSHES)
  const landing = random.pick(LANDINGS)
  const plates = random.pick([1, 2] as const)
  const share = (): number => random.between(0.46, 0.54)
  const jump = makeJump(
    {
      massKg: random.between(MASSES[mass].from, MASSES[mass].to),
      takeoffVelocity: random.between(1.9, 3.1),
      depthM: random.between(0.22, 0.42),
      stanceS: random.between(1.4, 3.2),
      unweightingS: random.between(0.36, 0.52),
      pushS: random.between(0.32, 0.46),
      unloadingS: random.between(0.03, 0.05),
      push,
      takeoffEdge: random.pick(['soft', 'steep'] as const),
      landing,
      touchdownEdge: random.pick(['soft', 'steep'] as const),
      landingS: random.between(0.18, 0.32),
      landsLowerM: random.between(0, 0.04),
      risingS: random.between(0.7, 1.1),
      shares: {
        stance: share(),
        unweighting: share(),
        braking: share(),
        propulsion: share(),
        landing: share(),
      },
      body: drawBody(noise, random),
    },
    number,
  )
  const durationS = jump.design.restS + random.between(1.5, 2.5)
  const recording = recordJump(
    jump,
    { sampleRateHz: rate, durationS, plates },
    { left: drawPlate(noise, random), right: drawPlate(noise, random) },
    number,
  )
  return { jump, recording, strata: { rate: `${rate} Hz`, noise, mass, push, landing, plates: `${plates}` } }
}
