import type { Recording } from '../../shared/mechanics/types.ts'
import type { Jump } from './jump.ts'
import { defaultSampling, perfectPlate } from './options.ts'
import type { PlateOptions, SamplingOptions } from './options.ts'
import { measure } from './plate.ts'
import { seededRandom } from './random.ts'

/** The plates in use: with one plate the first counts. */
export interface Plates {
  left: Partial<PlateOptions>
  right: Partial<PlateOptions>
}

/** A jump as the plates record it, unrounded; `seed` decides the plates' noise. */
export function recordJump(
  jump: Jump,
  given: Partial<SamplingOptions> = {},
  plates: Partial<Plates> = {},
  seed = 1,
): Recording {
  const sampling = { ...defaultSampling, ...given }
  const { sampleRateHz } = sampling
  const samples = Math.round(sampling.durationS * sampleRateHz)
  const random = seededRandom(seed ^ 0x5bd1e995)
  const left = { ...perfectPlate, ...plates.left }
  const right = { ...perfectPlate, ...plates.right }
  const first = new Float64Array(samples)
  const second = new Float64Array(sampling.plates === 2 ? samples : 0)
  for (let i = 0; i < samples; i++) {
    const timeS = i / sampleRateHz
    const force = jump.force(timeS)
    first[i] = force
    if (sampling.plates === 1) continue
    const leftForce = force * jump.leftShare(timeS)
    first[i] = leftForce
    second[i] = force - leftForce
  }
  measure(first, sampleRateHz, jump.design.touchS, left, random)
  if (sampling.plates === 2) measure(second, sampleRateHz, jump.design.touchS, right, random)
  return {
    sampleRateHz,
    channels: sampling.plates === 2 ? { left: first, right: second } : { single: first },
    filledSamples: 0,
    timeBaseError: 0,
    notes: [],
  }
}
