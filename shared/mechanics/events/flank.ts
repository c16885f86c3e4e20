import type { Settings } from '../settings.ts'
import { estimateNoise, weightedNoise, type Noise } from '../signal/noise.ts'

/** Which way force runs through the threshold: falling at takeoff, rising at touchdown. */
export type FlankDirection = 'falling' | 'rising'

/** A crossing placed between samples. */
export interface Crossing {
  /** Position in samples from the record's first. */
  position: number
  /** Standard uncertainty of the position from noise, samples. */
  positionU: number
  /** Slope of the force there, N a sample, negative at takeoff. */
  slope: number
}

/** Force that leaves zero at `foot` as rise·x + bend·x², x samples inside the contact. */
interface Flank {
  foot: number
  rise: number
  bend: number
  misfit: number
}

const fewestFlankSamples = 5
const weights = new Float64Array(512)

/** Best rise and bend for a given foot, by least squares, the rise not negative; y(u) runs from the flight into contact. */
function fitAtFoot(y: Float64Array, count: number, foot: number, into: Flank): void {
  let s2 = 0
  let s3 = 0
  let s4 = 0
  let t1 = 0
  let t2 = 0
  let yy = 0
  for (let u = 0; u < count; u++) {
    const value = y[u]
    yy += value * value
    const x = u - foot
    if (x <= 0) continue
    const xx = x * x
    s2 += xx
    s3 += xx * x
    s4 += xx * xx
    t1 += value * x
    t2 += value * xx
  }
  const determinant = s2 * s4 - s3 * s3
  let rise = determinant > 1e-9 * s2 * s4 ? (t1 * s4 - t2 * s3) / determinant : s2 > 0 ? t1 / s2 : 0
  let bend = determinant > 1e-9 * s2 * s4 ? (t2 * s2 - t1 * s3) / determinant : 0
  if (rise < 0) {
    rise = 0
    bend = s4 > 0 ? t2 / s4 : 0
  }
  into.foot = foot
  into.rise = rise
  into.bend = bend
  into.misfit = yy - 2 * (rise * t1 + bend * t2) + rise * rise * s2 + 2 * rise * bend * s3 + bend * bend * s4
}

/** Searches the foot of the flank: every half sample first, then by golden section. */
function searchFoot(y: Float64Array, count: number, from: number, to: number): Flank {
  const trial: Flank = { foot: 0, rise: 0, bend: 0, misfit: Infinity }
  let best = from
  let least = Infinity
  for (let foot = from; foot <= to; foot += 0.5) {
    fitAtFoot(y, count, foot, trial)
    if (trial.misfit < least) {
      least = trial.misfit
      best = foot
    }
  }
  const golden = (Math.sqrt(5) - 1) / 2
  let a = best - 0.5
  let b = best + 0.5
  for (let step = 0; step < 14; step++) {
    const left = b - golden * (b - a)
    const right = a + golden * (b - a)
    fitAtFoot(y, count, left, trial)
    const atLeft = trial.misfit
    fitAtFoot(y, count, right, trial)
    if (atLeft < trial.misfit) b = right
    else a = left
  }
  fitAtFoot(y, count, (a + b) / 2, trial)
  return trial
}

/** Distance from the foot at which the flank reaches `force`. */
function reach(flank: Flank, force: number): number {
  const root = flank.rise * flank.rise + 4 * flank.bend * force
  return (2 * force) / (flank.rise + Math.sqrt(Math.max(0, root)))
}

/** Standard uncertainty of the crossing from the noise of the samples, by the linearised fit. */
function crossingNoise(flank: Flank, count: number, distance: number, slope: number, noise: Noise): number {
  const bound = flank.rise === 0
  const m = new Float64Array(9)
  for (let u = 0; u < count; u++) {
    const x = u - flank.foot
    if (x <= 0) continue
    const j = [bound ? 0 : x, x * x, -(flank.rise + 2 * flank.bend * x)]
    for (let r = 0; r < 3; r++) for (let c = 0; c < 3; c++) m[3 * r + c] += j[r] * j[c]
  }
  if (bound) m[0] = 1
  const g = [bound ? 0 : -distance / slope, -(distance * distance) / slope, 1]
  const solution = solve3(m, g)
  if (!solution) return Infinity
  for (let u = 0; u < count; u++) {
    const x = u - flank.foot
    weights[u] =
      x <= 0
        ? 0
        : (bound ? 0 : solution[0] * x) +
          solution[1] * x * x -
          solution[2] * (flank.rise + 2 * flank.bend * x)
  }
  return weightedNoise(weights, count, noise)
}

/** Solves the symmetric 3 × 3 system; `null` where it is singular. */
function solve3(m: Float64Array, g: number[]): number[] | null {
  const [a, b, c, , e, f, , , i] = m
  const cofactors = [e * i - f * f, c * f - b * i, b * f - c * e]
  const determinant = a * cofactors[0] + b * cofactors[1] + c * cofactors[2]
  if (!(Math.abs(determinant) > 1e-14 * Math.abs(a * e * i))) return null
  const inverse = [cofactors[0], cofactors[1], cofactors[2], a * i - c * c, b * c - a * f, a * e - b * b]
  return [
    (inverse[0] * g[0] + inverse[1] * g[1] + inverse[2] * g[2]) / determinant,
    (inverse[1] * g[0] + inverse[3] * g[1] + inverse[4] * g[2]) / determinant,
    (inverse[2] * g[0] + inverse[4] * g[1] + inverse[5] * g[2]) / determinant,
  ]
}

const window = new Float64Array(512)
const residuals = new Float64Array(512)

/** Where the samples of a flank lie in a record: u runs from the flight into the contact. */
interface FlankWindow {
  force: Float64Array
  firstContact: number
  step: 1 | -1
  outside: number
  longest: number
}

/** Fills the window with the samples around the edge, as far into the contact as `level` asks; `null` past the record. */
function fillWindow(
  { force, firstContact, step, outside, longest }: FlankWindow,
  level: number,
): number | null {
  let inside = 0
  for (; inside < longest; inside++) {
    const i = firstContact + step * inside
    if (i < 0 || i >= force.length) return null
    if (inside >= fewestFlankSamples && force[i] > level) break
  }
  const count = inside + outside
  for (let u = 0; u < count; u++) {
    const i = firstContact + step * (u - outside)
    window[u] = i >= 0 && i < force.length ? force[i] : 0
  }
  return count
}

/** Noise about the fitted flank: the plate's own, or what the fit leaves over where that is more (ringing, misfit). */
function noiseAbout(flank: Flank, count: number, noise: Noise): Noise {
  const rms = Math.sqrt(Math.max(0, flank.misfit) / Math.max(1, count - 3))
  if (rms <= noise.sd) return noise
  for (let u = 0; u < count; u++) {
    const x = Math.max(0, u - flank.foot)
    residuals[u] = window[u] - x * (flank.rise + flank.bend * x)
  }
  return { ...estimateNoise(residuals, 0, count), sd: rms }
}

/** The crossing by a straight line through the samples on both sides of the edge, good to about a sample. */
function straightCrossing({ force, firstContact, step }: FlankWindow, target: number): Crossing {
  const inside = force[firstContact]
  const rise = inside - force[Math.max(0, Math.min(force.length - 1, firstContact - step))]
  const back = rise > 0 ? Math.max(0, Math.min(1, (inside - target) / rise)) : 0
  return { position: firstContact - step * back, positionU: 1, slope: step * Math.max(rise, 1e-3) }
}

/** Misfit beyond which the fit is made anew over a longer flank, so that ringing averages out. */
const ringing = 1.5

/**
 * Places the crossing of the event force between samples. `edge` is the first sample of the flight (falling) or of
 * the contact (rising) at the noise-adapted threshold. The model is what physics asks for: nothing at all in flight,
 * and from the foot of the flank on a force that rises with a slope and a bend; its foot, slope and bend are fitted
 * by least squares to the samples around. Force must be zeroed. `null` where the flank leaves the record.
 */
export function fitFlank(
  force: Float64Array,
  edge: number,
  direction: FlankDirection,
  noise: Noise,
  dt: number,
  settings: Settings,
): Crossing | null {
  const place: FlankWindow = {
    force,
    firstContact: direction === 'falling' ? edge - 1 : edge,
    step: direction === 'falling' ? -1 : 1,
    outside: Math.max(8, Math.min(40, Math.round(0.012 / dt))),
    longest: Math.min(256, Math.max(fewestFlankSamples, Math.round(settings.flankLimitS / dt))),
  }
  const { outside, step } = place
  const target = settings.eventForceN
  const fit = (sd: number) => {
    const count = fillWindow(place, target + settings.flankNoise * sd)
    if (count === null) return null
    const earliest = outside - Math.min(outside, 0.01 / dt + 2)
    return { count, flank: searchFoot(window, count, earliest, outside + 2) }
  }
  let fitted = fit(noise.sd)
  if (!fitted) return null
  let about = noiseAbout(fitted.flank, fitted.count, noise)
  if (about.sd > ringing * noise.sd) {
    fitted = fit(about.sd) ?? fitted
    about = noiseAbout(fitted.flank, fitted.count, noise)
  }
  const { flank, count } = fitted
  const distance = reach(flank, target)
  const slope = flank.rise + 2 * flank.bend * distance
  if (!(slope > 0) || !Number.isFinite(distance)) return straightCrossing(place, target)
  const positionU = crossingNoise(flank, count, distance, slope, about)
  return {
    position: place.firstContact + step * (flank.foot + distance - outside),
    positionU: Number.isFinite(positionU) ? positionU : 1,
    slope: step * slope,
  }
}
