import type { Settings } from '../settings.ts'
import { fitParabola, parabolaCrossing, parabolaNoiseAt, parabolaSlopeAt } from '../signal/local-parabola.ts'
import type { Noise } from '../signal/noise.ts'
import type { Peak } from '../signal/peak.ts'

/** A level's last upward crossing before the peak, between samples. */
export interface RiseCrossing {
  position: number
  positionU: number
  /** N a sample */
  slope: number
}

/** The 20 and 80 % crossings of a landing peak. */
export interface Rise {
  low: RiseCrossing
  high: RiseCrossing
  /** Why the rate has no honest uncertainty, if so. */
  doubt: string | null
}

/**
 * Last sample before the peak that is still under the level, walking back from the peak over a short running mean;
 * `null` where force never was under it since touchdown.
 */
function lastBelow(force: Float64Array, level: number, from: number, peak: number): number | null {
  for (let i = Math.floor(peak); i >= from - 1 && i >= 0; i--) if (force[i] < level) return i
  return null
}

function placeCrossing(
  force: Float64Array,
  level: number,
  below: number,
  half: number,
  noise: Noise,
): RiseCrossing | null {
  let fit = fitParabola(force, below + 0.5, half)
  let position = parabolaCrossing(fit, level, below + 0.5, half + 2)
  if (position === null) return null
  fit = fitParabola(force, position, half)
  position = parabolaCrossing(fit, level, position, half + 1) ?? position
  const slope = parabolaSlopeAt(fit, position)
  if (!(slope > 0)) return null
  return { position, positionU: parabolaNoiseAt(fit, position, noise) / slope, slope }
}

/** Whether force turns within the noise of a level, so that noise alone decides which crossing is the last. */
function isAmbiguous(
  force: Float64Array,
  level: number,
  crossing: number,
  from: number,
  peak: number,
  band: number,
): boolean {
  let lowestAfter = Infinity
  for (let i = Math.ceil(crossing); i <= peak; i++)
    if (i - crossing > 3) lowestAfter = Math.min(lowestAfter, force[i])
  if (lowestAfter < level + band) return true
  let lowest = Infinity
  let highestBefore = -Infinity
  for (let i = Math.floor(crossing); i >= from; i--) {
    lowest = Math.min(lowest, force[i])
    if (lowest < level - band) break
    highestBefore = Math.max(highestBefore, force[i])
  }
  return highestBefore > level + band
}

/**
 * Crossings of 20 and 80 % of the peak on the way up: the last upward ones before it. `null` where the force does not
 * rise through both.
 */
export function findRise(
  force: Float64Array,
  touchdown: number,
  peak: Peak,
  noise: Noise,
  settings: Settings,
): Rise | null {
  const from = Math.floor(touchdown)
  const levels = [settings.loadingRateLow * peak.value, settings.loadingRateHigh * peak.value]
  const below = levels.map((level) => lastBelow(force, level, from, peak.position))
  if (below[0] === null || below[1] === null) return null
  const half = Math.max(1, Math.min(4, Math.round((below[1] - below[0]) / 8)))
  const low = placeCrossing(force, levels[0], below[0], half, noise)
  const high = placeCrossing(force, levels[1], below[1], half, noise)
  if (!low || !high || !(high.position > low.position)) return null
  const band = 3 * noise.sd
  const turns =
    isAmbiguous(force, levels[0], low.position, from, peak.position, band) ||
    isAmbiguous(force, levels[1], high.position, from, peak.position, band)
  const few = high.position - low.position < settings.loadingRateSamples
  return { low, high, doubt: turns ? turning : few ? fewSamples : null }
}

const fewSamples =
  'Fewer than 8 samples lie between 20 and 80 % of the peak: the slope is sampled too coarsely.'
const turning =
  'The force turns near 20 or 80 % of the peak, so that noise decides where the slope begins or ends.'

/** Greatest regression slope of force over a window, N a sample, between two positions; `null` of too few samples. */
export function greatestSlope(
  force: Float64Array,
  from: number,
  to: number,
  window: number,
): { slope: number; slopeU: number; centre: number } | null {
  const half = Math.max(1, Math.round(window / 2))
  const s2 = (half * (half + 1) * (2 * half + 1)) / 3
  let slope = -Infinity
  let centre = -1
  for (let c = Math.max(half, Math.ceil(from)); c <= to && c + half < force.length; c++) {
    let product = 0
    for (let x = 1; x <= half; x++) product += x * (force[c + x] - force[c - x])
    if (product / s2 > slope) {
      slope = product / s2
      centre = c
    }
  }
  return centre < 0 ? null : { slope, slopeU: 1 / Math.sqrt(s2), centre }
}
