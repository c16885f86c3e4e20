import type { Settings } from '../settings.ts'
import { usualLevel } from '../signal/condition.ts'
import { meanOver, type RunningSums } from '../signal/running-mean.ts'

/** Samples from (inclusive) to (exclusive). */
export interface Stretch {
  from: number
  to: number
}

/** Where the plates carry nobody. */
export interface Unloaded {
  /** Force of the empty plates as recorded, N. */
  level: number
  sd: number
  /** Usual force of the loaded plates as recorded, N. */
  stanceLevel: number
  /** Unloaded stretches between two loaded ones, short enough for a flight. */
  flights: Stretch[]
  /** Unloaded too long for a flight, or at an end of the record. */
  offPlate: Stretch[]
}

/** Start of the window of `width` samples with the least mean, to a tenth of a window. */
function lowestWindow(sums: RunningSums, length: number, width: number): number {
  const step = Math.max(1, Math.floor(width / 10))
  let lowest = 0
  let least = Infinity
  for (let i = 0; i + width <= length; i += step) {
    const sum = sums.sums[i + width] - sums.sums[i]
    if (sum < least) {
      least = sum
      lowest = i
    }
  }
  return lowest
}

function spread(force: Float64Array, from: number, to: number, mean: number): number {
  let squares = 0
  for (let i = from; i < to; i++) squares += (force[i] - mean) * (force[i] - mean)
  return Math.sqrt(squares / Math.max(1, to - from - 1))
}

/** Usual level of what lies well above the empty plates. */
function usualLoad(force: Float64Array, level: number, smallestLoad: number): number {
  const usual = usualLevel(force)
  if (usual > level + smallestLoad) return usual
  return usualLevel(force.filter((value) => value > level + smallestLoad))
}

function staysBelow(force: Float64Array, from: number, to: number, weak: number): boolean {
  for (let i = from; i < to; i++) if (force[i] >= weak) return false
  return true
}

/**
 * Stretches below `threshold`, joined over gaps shorter than `gap` samples and over those in which the force stays
 * below `weak`: slow noise of empty plates, not a foot.
 */
function stretchesBelow(force: Float64Array, threshold: number, gap: number, weak: number): Stretch[] {
  const { length } = force
  const found: Stretch[] = []
  let i = 0
  while (i < length) {
    while (i < length && !(force[i] < threshold)) i++
    if (i === length) break
    const from = i
    while (i < length && force[i] < threshold) i++
    const last = found.at(-1)
    if (last && (from - last.to < gap || staysBelow(force, last.to, from, weak))) last.to = i
    else found.push({ from, to: i })
  }
  return found
}

/**
 * Finds where the plates carry nobody: the lowest tenth of a second gives the level and noise of the empty plates,
 * and a threshold that adapts to that noise cuts the stretches. `null` where nothing stands out as empty.
 */
export function findUnloaded(
  force: Float64Array,
  sums: RunningSums,
  dt: number,
  settings: Settings,
): Unloaded | null {
  const width = Math.max(2, Math.round(settings.unloadedWindowS / dt))
  if (force.length < 2 * width) return null
  const start = lowestWindow(sums, force.length, width)
  const level = meanOver(sums, start, start + width)
  const sd = spread(force, start, start + width, level)
  const stanceLevel = usualLoad(force, level, settings.smallestLoadN)
  if (!(stanceLevel - level > settings.smallestLoadN)) return null

  const load = stanceLevel - level
  const threshold = level + Math.max(settings.eventForceN, settings.unloadedSd * sd)
  const near = settings.zeroShare * load
  const nearZero = Math.abs(level) < near || Math.abs(stanceLevel) < near
  // A large offset is believed only of a flat trace; the bottom of a slow squat lies higher still.
  const offset = Math.abs(level) < settings.offsetShare * load && sd < settings.offsetSpread * load
  if (threshold > level + load / 2 || (!nearZero && !offset)) return null

  const gap = Math.round(settings.shortestContactS / dt)
  const shortest = settings.eventPersistenceS / dt
  const longest = settings.longestFlightS / dt
  const weak = level + settings.smallestLoadN
  const flights: Stretch[] = []
  const offPlate: Stretch[] = []
  for (const stretch of stretchesBelow(force, threshold, gap, weak)) {
    const inside = stretch.from > 0 && stretch.to < force.length
    const duration = stretch.to - stretch.from
    if (inside && duration <= longest) {
      if (duration >= 0.9 * shortest) flights.push(stretch)
    } else if (duration >= shortest || !inside) offPlate.push(stretch)
  }
  return { level, sd, stanceLevel, flights, offPlate }
}
