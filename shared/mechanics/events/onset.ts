import type { Settings } from '../settings.ts'
import { fitParabola, parabolaCrossing, parabolaNoiseAt, parabolaSlopeAt } from '../signal/local-parabola.ts'
import type { Noise } from '../signal/noise.ts'
import { meanAround, type RunningSums } from '../signal/running-mean.ts'
import type { WeighingWindow } from './weighing.ts'

/** The beginning of the movement. */
export interface Onset {
  /** Position of the onset in samples: the lead before the crossing. */
  position: number
  /** Position of the crossing of the onset threshold, samples. */
  crossing: number
  /** Standard uncertainty of the position from noise, samples. */
  positionU: number
  /** Slope of the force at the crossing, N a sample. */
  slope: number
  /** Share of the weight at which the crossing lies, e.g. 0.975. */
  level: number
  /** Whether quiet stance was found before the movement. */
  fromQuiet: boolean
}

interface Search {
  sums: RunningSums
  weight: number
  half: number
}

function deviation(search: Search, sample: number): number {
  return meanAround(search.sums, sample, search.half) - search.weight
}

/** First sample of the movement that leads to the flight: the earliest gross deviation without a long pause after it. */
function firstGrossDeviation(
  search: Search,
  takeoff: number,
  earliest: number,
  gross: number,
  gap: number,
): number {
  const { sums, weight, half } = search
  const { sums: running, reference, length } = sums
  // Inside the record the running mean is one subtraction; a jump's search seldom comes near the ends.
  const width = 2 * half + 1
  const target = (weight - reference) * width
  const asked = gross * width
  let first = takeoff
  for (let i = takeoff; i >= earliest && first - i <= gap; i--) {
    const inside = i >= half && i + half < length
    const distance = inside
      ? running[i + half + 1] - running[i - half] - target
      : deviation(search, i) * width
    if (distance >= asked || distance <= -asked) first = i
  }
  return first
}

/** Walks back to where the force had stayed within the threshold for the asked time; the first sample beyond it. */
function leaveOfQuiet(
  search: Search,
  first: number,
  earliest: number,
  threshold: number,
  persistence: number,
) {
  let crossing = first
  for (let i = first; i >= earliest; i--) {
    if (Math.abs(deviation(search, i)) > threshold) crossing = i
    else if (crossing - i >= persistence) return { crossing, fromQuiet: true }
  }
  return { crossing, fromQuiet: crossing - earliest >= persistence / 2 }
}

/** Samples from the crossing to the gross deviation. */
function wayToGross(search: Search, crossing: number, latest: number, gross: number): number {
  let i = crossing
  while (i < latest && Math.abs(deviation(search, i)) < gross) i++
  return i - crossing
}

/**
 * Onset: `onsetLeadS` before the force leaves the band of ±`onsetFraction` of the weight (or so many standard
 * deviations of the weighing, by `onsetRule`) at the start of the movement that leads to the flight. Found on a
 * running mean, placed by a parabola fitted to the unfiltered force around the crossing.
 */
export function findOnset(
  force: Float64Array,
  sums: RunningSums,
  weighing: WeighingWindow,
  limits: { earliest: number; takeoff: number },
  noise: Noise,
  dt: number,
  settings: Settings,
): Onset {
  const weight = weighing.systemWeight
  const half = Math.max(1, Math.round(settings.onsetSmoothingS / dt / 2))
  const search = { sums, weight, half }
  const gross = settings.movementFraction * weight
  const threshold =
    settings.onsetRule === 'fraction' ? settings.onsetFraction * weight : settings.onsetSd * weighing.spread
  const first = firstGrossDeviation(
    search,
    limits.takeoff,
    limits.earliest,
    gross,
    settings.movementGapS / dt,
  )
  const { crossing, fromQuiet } = leaveOfQuiet(
    search,
    first,
    limits.earliest,
    threshold,
    settings.quietPersistenceS / dt,
  )

  const sign = deviation(search, crossing) >= 0 ? 1 : -1
  const target = weight + sign * threshold
  const way = wayToGross(search, crossing, limits.takeoff, gross)
  const reach = Math.max(4, Math.min(settings.onsetFitShare * way, settings.onsetFitLongestS / dt))
  let fit = fitParabola(force, crossing, reach)
  let position = parabolaCrossing(fit, target, crossing, 1.5 * reach) ?? crossing
  fit = fitParabola(force, position, reach)
  position = parabolaCrossing(fit, target, position, reach) ?? position
  const gentlest = (settings.onsetGentleStart * Math.max(0, gross - threshold)) / Math.max(1, way)
  const fitted = Math.abs(parabolaSlopeAt(fit, position))
  const slope = sign * (gentlest > 0 ? Math.min(fitted, gentlest) : fitted)
  const positionU = Math.min(reach, parabolaNoiseAt(fit, position, noise) / Math.abs(slope))
  const lead = settings.onsetLeadS / dt
  return {
    position: Math.max(limits.earliest, position - lead),
    crossing: position,
    positionU,
    slope,
    level: target / weight,
    fromQuiet,
  }
}
