import type { Settings } from '../settings.ts'
import { allowForShortness, estimateNoise, weightedNoise, type Noise } from '../signal/noise.ts'
import { crossingWeights, flankForce, flankSlope, reachOf, searchFoot, type Flank } from './flank-model.ts'

/** Which way force runs through the threshold: falling at takeoff, rising at touchdown. */
export type FlankDirection = 'falling' | 'rising'

/** A crossing placed between samples. */
export interface Crossing {
  /** Position in samples from the record's first. */
  position: number
  /** Standard uncertainty of the position, samples. */
  positionU: number
  /** The part of it from ringing, which is alike in every touch; not given of an instant set by hand, samples. */
  ringingU?: number
  /** Slope of the force there, N a sample, negative at takeoff. */
  slope: number
}

/** Where the samples of a flank lie in a record: u runs from the flight into the contact. */
interface FlankWindow {
  force: Float64Array
  firstContact: number
  step: 1 | -1
  outside: number
  longest: number
}

/** A fitted flank with the number of samples it was fitted to, and the noise about it inside the contact. */
interface Fitted {
  flank: Flank
  count: number
  noise: Noise
  /** Ringing of the plate about the flank, N; 0 where there is none. */
  ringing: number
}

const fewestFlankSamples = 5
const room = 512
const window = new Float64Array(room)
const weights = new Float64Array(room)
const residuals = new Float64Array(room)

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

/** Noise about the flank inside the contact: the plate's own, or what the fit leaves over where that is more. */
function noiseAbout(flank: Flank, count: number, noise: Noise): Noise {
  const first = Math.max(0, Math.ceil(flank.foot))
  let squares = 0
  for (let u = first; u < count; u++) {
    residuals[u] = window[u] - flankForce(flank, u - flank.foot)
    squares += residuals[u] * residuals[u]
  }
  const rms = Math.sqrt(squares / Math.max(1, count - first - 2))
  return rms > noise.sd ? { ...allowForShortness(estimateNoise(residuals, first, count)), sd: rms } : noise
}

function fit(
  place: FlankWindow,
  level: number,
  highest: number,
  noise: Noise,
  dt: number,
  footS: number,
): Fitted | null {
  const count = fillWindow(place, level)
  if (count === null) return null
  const { outside } = place
  const earliest = outside - Math.min(outside, Math.floor(footS / dt) + 2)
  const flank = searchFoot(window, count, earliest, outside + 2, highest)
  return { flank, count, noise: noiseAbout(flank, count, noise), ringing: 0 }
}

/**
 * A rise with slope and bend; where that leaves more than noise, a third power if it explains the rest, else ringing,
 * and a longer stretch of the flank is taken so that it averages out.
 */
function bestFit(place: FlankWindow, noise: Noise, dt: number, settings: Settings): Fitted | null {
  const level = (sd: number) => settings.eventForceN + settings.flankNoise * sd
  const simple = fit(place, level(noise.sd), 2, noise, dt, settings.flankFootS)
  if (!simple || simple.noise.sd <= settings.flankMisfitSd * noise.sd) return simple
  const bent = fit(place, level(noise.sd), 3, noise, dt, settings.flankFootS)
  if (bent && bent.flank.misfit < settings.flankThirdPower * simple.flank.misfit) return bent
  const long = fit(place, level(simple.noise.sd), 2, noise, dt, settings.flankFootS) ?? simple
  return { ...long, ringing: long.noise.sd }
}

/** The crossing by a straight line through the samples on both sides of the edge, good to about a sample. */
function straightCrossing({ force, firstContact, step }: FlankWindow, target: number): Crossing {
  const inside = force[firstContact]
  const rise = inside - force[Math.max(0, Math.min(force.length - 1, firstContact - step))]
  const back = rise > 0 ? Math.max(0, Math.min(1, (inside - target) / rise)) : 0
  return { position: firstContact - step * back, positionU: 1, slope: step * Math.max(rise, 1e-3) }
}

/** Force that leaps between two samples (a landing on a rigid stop, a clamped record) crosses anywhere between them. */
function stepCrossing({ force, firstContact, step }: FlankWindow, settings: Settings): Crossing | null {
  const outside = firstContact - step
  const next = firstContact + step
  if (outside < 0 || next < 0 || outside >= force.length || next >= force.length) return null
  const leap = force[firstContact] - force[outside]
  const isStep =
    leap > settings.flankStep * settings.eventForceN && leap > 3 * Math.abs(force[next] - force[firstContact])
  if (!isStep) return null
  return { position: firstContact - step / 2, positionU: 1 / Math.sqrt(12), slope: step * leap }
}

/**
 * Places the crossing of the event force between samples. `edge` is the first sample of the flight (falling) or of
 * the contact (rising) at the noise-adapted threshold. The model is what physics asks for: nothing at all in flight,
 * and from the foot of the flank on a force that rises smoothly; foot and rise are fitted by least squares to the
 * samples around. Force must be zeroed. `null` where the flank leaves the record.
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
    outside: Math.max(8, Math.min(40, Math.round(settings.flankOutsideS / dt))),
    longest: Math.min(256, Math.max(fewestFlankSamples, Math.round(settings.flankLimitS / dt))),
  }
  const { outside, step } = place
  const leap = stepCrossing(place, settings)
  if (leap) return leap
  const fitted = bestFit(place, noise, dt, settings)
  if (!fitted) return null
  const { flank, count } = fitted
  const distance = reachOf(flank, settings.eventForceN, count)
  const slope = distance === null ? 0 : flankSlope(flank, distance)
  if (distance === null || !(slope > 0)) return straightCrossing(place, settings.eventForceN)
  const known = crossingWeights(flank, count, distance, weights)
  const fromNoise = known ? weightedNoise(weights, count, fitted.noise) : 1
  const lifted = reachOf(flank, settings.eventForceN + fitted.ringing, count) ?? count
  const ringingU = settings.flankRinging * (lifted - distance)
  return {
    position: place.firstContact + step * (flank.foot + distance - outside),
    positionU: Math.hypot(fromNoise, ringingU),
    ringingU,
    slope: step * slope,
  }
}
