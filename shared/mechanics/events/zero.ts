import type { Settings } from '../settings.ts'
import { addUp, type Signal } from '../signal/condition.ts'
import { allowForShortness, effectiveSamples, estimateNoise, type Noise } from '../signal/noise.ts'
import type { Stretch } from './unloaded.ts'

/** What the unloaded plates say: zero and noise. */
export interface Zero {
  /** Sample in the middle of the stretch. */
  centre: number
  /** Noise of each plate, in the order of the signal's plates, and of the total. */
  plates: Noise[]
  total: Noise
  /** Degrees of freedom of the noise of the total: its independent samples less one. */
  noiseDof: number
  /** Standard uncertainty of each plate's zero, N, with degrees of freedom. */
  offsetU: number[]
  offsetDof: number[]
}

/** The inner part of an unloaded stretch, clear of ringing at its edges, at most a second long. */
function inner({ from, to }: Stretch, dt: number, settings: Settings): Stretch {
  const margin = Math.min(Math.round(settings.flightMarginS / dt), Math.floor((to - from) / 3))
  const end = Math.min(to - margin, from + margin + Math.round(1 / dt))
  return { from: from + margin, to: end }
}

/**
 * Takes each plate's zero from an unloaded stretch and subtracts it from the signal (which is the engine's own copy).
 * A plate that was tared with the athlete on it is put right by the same step.
 */
export function zeroPlates(signal: Signal, unloaded: Stretch, settings: Settings): Zero {
  const stretch = inner(unloaded, signal.dt, settings)
  const noiseOf = (force: Float64Array) => allowForShortness(estimateNoise(force, stretch.from, stretch.to))
  const plates = signal.plates.map((plate) => noiseOf(plate.force))
  addUp(
    signal.plates,
    signal.total,
    plates.map(({ mean }) => mean),
  )
  signal.plates.forEach((plate, i) => (plate.offsetN = plates[i].mean))
  const total = signal.plates.length === 1 ? plates[0] : noiseOf(signal.total)
  const dofOf = (noise: Noise) => Math.max(1, effectiveSamples(noise) - 1)
  return {
    centre: (stretch.from + stretch.to - 1) / 2,
    plates,
    total,
    noiseDof: dofOf(total),
    offsetU: plates.map((noise) => noise.sd / Math.sqrt(effectiveSamples(noise))),
    offsetDof: plates.map(dofOf),
  }
}
