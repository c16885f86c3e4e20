import type { ForceChannel, Recording } from '../../shared/mechanics/types.ts'
import { defaultSampling, perfectPlate } from './options.ts'
import type { PlateOptions, SamplingOptions } from './options.ts'
import type { OnPlates } from './perform.ts'
import { measure } from './plate.ts'
import { seededRandom } from './random.ts'

/** The plates in use: with one plate the first counts. */
export interface Plates {
  left: Partial<PlateOptions>
  right: Partial<PlateOptions>
}

/** A plate that carries less than this share when feet strike is not struck. */
const STRUCK_SHARE = 0.02

function channelsOf(
  plates: SamplingOptions['plates'],
  first: Float64Array,
  second: Float64Array,
): Partial<Record<ForceChannel, Float64Array>> {
  if (plates === 2) return { left: first, right: second }
  if (plates === 1) return { single: first }
  return { total: first.map((force, i) => force + (second[i] ?? 0)) }
}

/**
 * A jump, or all of a performance, as the plates record it, unrounded; `seed` decides the plates' noise. Times of
 * the recording count from `startS` on the athlete's clock.
 */
export function recordJump(
  { force, leftShare, touchesS }: OnPlates,
  given: Partial<SamplingOptions> = {},
  plates: Partial<Plates> = {},
  seed = 1,
): Recording {
  const sampling = { ...defaultSampling, ...given }
  const { sampleRateHz, startS } = sampling
  const samples = Math.round(sampling.durationS * sampleRateHz)
  const random = seededRandom(seed ^ 0x5bd1e995)
  const hasTwo = sampling.plates !== 1
  const first = new Float64Array(samples)
  const second = new Float64Array(hasTwo ? samples : 0)
  for (let i = 0; i < samples; i++) {
    const timeS = startS + i / sampleRateHz
    const total = force(timeS)
    first[i] = total
    if (!hasTwo) continue
    const leftForce = total * leftShare(timeS)
    first[i] = leftForce
    second[i] = total - leftForce
  }
  const touchesOf = (share: (timeS: number) => number): number[] =>
    touchesS.filter((timeS) => !hasTwo || share(timeS) > STRUCK_SHARE).map((timeS) => timeS - startS)
  const left = { ...perfectPlate, ...plates.left }
  measure(first, sampleRateHz, touchesOf(leftShare), left, random)
  const right = { ...perfectPlate, ...plates.right }
  const rightShare = (timeS: number): number => 1 - leftShare(timeS)
  if (hasTwo) measure(second, sampleRateHz, touchesOf(rightShare), right, random)
  return {
    sampleRateHz,
    channels: channelsOf(sampling.plates, first, second),
    filledSamples: 0,
    timeBaseError: 0,
    notes: [],
  }
}
