import { weightedNoise, type Noise } from './noise.ts'

/** Least-squares parabola through samples around a centre: y ≈ level + slope·x + bend·x², x in samples from the centre. */
export interface Parabola {
  centre: number
  half: number
  level: number
  slope: number
  bend: number
}

/** Fits a parabola to the 2·half + 1 samples around `centre`, kept inside the record. At least three samples. */
export function fitParabola(force: Float64Array, centre: number, half: number): Parabola {
  const widest = (force.length - 1) >> 1
  const h = Math.max(1, Math.min(Math.round(half), widest))
  const c = Math.max(h, Math.min(Math.round(centre), force.length - 1 - h))
  const n = 2 * h + 1
  const s2 = (h * (h + 1) * n) / 3
  const s4 = (s2 * (3 * h * h + 3 * h - 1)) / 5
  let y0 = 0
  let y1 = 0
  let y2 = 0
  for (let x = -h; x <= h; x++) {
    const y = force[c + x]
    y0 += y
    y1 += y * x
    y2 += y * x * x
  }
  const bend = (y2 - (s2 * y0) / n) / (s4 - (s2 * s2) / n)
  return { centre: c, half: h, level: (y0 - bend * s2) / n, slope: y1 / s2, bend }
}

export function parabolaAt(fit: Parabola, sample: number): number {
  const x = sample - fit.centre
  return fit.level + x * (fit.slope + x * fit.bend)
}

export function parabolaSlopeAt(fit: Parabola, sample: number): number {
  return fit.slope + 2 * fit.bend * (sample - fit.centre)
}

const weights = new Float64Array(4096)

/** Standard uncertainty of the fitted value at a place, from the noise of the samples. */
export function parabolaNoiseAt(fit: Parabola, sample: number, noise: Noise): number {
  const h = fit.half
  const n = 2 * h + 1
  if (n > weights.length) return noise.sd
  const s2 = (h * (h + 1) * n) / 3
  const s4 = (s2 * (3 * h * h + 3 * h - 1)) / 5
  const bendNorm = s4 - (s2 * s2) / n
  const at = sample - fit.centre
  for (let x = -h; x <= h; x++) {
    const bendWeight = (x * x - s2 / n) / bendNorm
    weights[x + h] = 1 / n - (bendWeight * s2) / n + (x / s2) * at + bendWeight * at * at
  }
  return weightedNoise(weights, n, noise)
}

/** Standard uncertainty of the fitted slope at the centre, in newtons a sample. */
export function parabolaSlopeNoise(fit: Parabola, noise: Noise): number {
  const h = fit.half
  const n = 2 * h + 1
  if (n > weights.length) return noise.sd
  const s2 = (h * (h + 1) * n) / 3
  for (let x = -h; x <= h; x++) weights[x + h] = x / s2
  return weightedNoise(weights, n, noise)
}

/**
 * Where the parabola takes the value `target`, nearest to `near` (samples); `null` where it does not within
 * `reach` samples.
 */
export function parabolaCrossing(fit: Parabola, target: number, near: number, reach: number): number | null {
  const c = fit.level - target
  const discriminant = fit.slope * fit.slope - 4 * fit.bend * c
  if (discriminant < 0) return null
  const q = -0.5 * (fit.slope + Math.sign(fit.slope || 1) * Math.sqrt(discriminant))
  const first = fit.centre + (q !== 0 ? c / q : NaN)
  const second = fit.centre + q / fit.bend
  const nearest = !(Math.abs(second - near) < Math.abs(first - near)) ? first : second
  return Math.abs(nearest - near) <= reach ? nearest : null
}
