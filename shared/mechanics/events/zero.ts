import type { Settings } from '../settings.ts'
import type { Plate, Signal } from '../signal/condition.ts'
import { allowForShortness, effectiveSamples, estimateNoise, type Noise } from '../signal/noise.ts'
import type { RunningSums } from '../signal/running-mean.ts'
import { borrow } from '../signal/workspace.ts'
import type { Stretch } from './unloaded.ts'

/** A plate's force with its zero taken off. */
export interface ZeroedPlate extends Plate {
  /** Zero offset taken off, N. */
  offsetN: number
  sums: RunningSums
}

/** The signal that events and figures are read from: a copy of its own. */
export type ZeroedSignal = Signal<ZeroedPlate>

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

/** Takes an offset off a plate and sums it up, in one pass. */
function zeroPlate(plate: Plate, offsetN: number): ZeroedPlate {
  const raw = plate.force
  const { length } = raw
  const force = borrow(`force of ${plate.channel}`, length)
  const sums = borrow(`sums of ${plate.channel}`, length + 1)
  const reference = raw[0] - offsetN
  sums[0] = 0
  let sum = 0
  for (let i = 0; i < length; i++) {
    const newton = raw[i] - offsetN
    force[i] = newton
    sum += newton - reference
    sums[i + 1] = sum
  }
  return { ...plate, force, offsetN, sums: { sums, reference, length } }
}

/** The total of zeroed plates. Its running sums stay: they count from the first sample. */
function zeroTotal(
  signal: Signal,
  plates: readonly ZeroedPlate[],
): { total: Float64Array; sums: RunningSums } {
  if (plates.length === 1) return { total: plates[0].force, sums: plates[0].sums }
  const { length } = signal
  const total = borrow('zeroed total', length)
  const left = plates[0].force
  const right = plates[1].force
  for (let i = 0; i < length; i++) total[i] = left[i] + right[i]
  return { total, sums: { ...signal.sums, reference: total[0] } }
}

/**
 * Takes each plate's zero from an unloaded stretch and gives the signal without it. A plate that was tared with the
 * athlete on it is put right by the same step.
 */
export function zeroPlates(
  signal: Signal,
  unloaded: Stretch,
  settings: Settings,
): { zero: Zero; signal: ZeroedSignal } {
  const { from, to } = inner(unloaded, signal.dt, settings)
  const noiseOf = (force: Float64Array) => allowForShortness(estimateNoise(force, from, to))
  const noises = signal.plates.map(({ force }) => noiseOf(force))
  const plates = signal.plates.map((plate, i) => zeroPlate(plate, noises[i].mean))
  const zeroed = { ...signal, plates, ...zeroTotal(signal, plates) }
  const total = noises.length === 1 ? noises[0] : noiseOf(zeroed.total)
  const dofOf = (noise: Noise) => Math.max(1, effectiveSamples(noise) - 1)
  return {
    signal: zeroed,
    zero: {
      centre: (from + to - 1) / 2,
      plates: noises,
      total,
      noiseDof: dofOf(total),
      offsetU: noises.map((noise) => noise.sd / Math.sqrt(effectiveSamples(noise))),
      offsetDof: noises.map(dofOf),
    },
  }
}
