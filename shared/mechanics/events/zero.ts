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

const slots = (channel: string, length: number) => ({
  force: borrow(`force of ${channel}`, length),
  sums: borrow(`sums of ${channel}`, length + 1),
})

/** Takes the offset off the only plate and sums it up, in one pass. */
function zeroOne(signal: Signal, offsetN: number): ZeroedSignal {
  const [plate] = signal.plates
  const { length } = signal
  const raw = plate.force
  const { force, sums } = slots(plate.channel, length)
  const reference = raw[0] - offsetN
  let sum = 0
  sums[0] = 0
  for (let i = 0; i < length; i++) {
    const newton = raw[i] - offsetN
    force[i] = newton
    sum += newton - reference
    sums[i + 1] = sum
  }
  const own = { sums, reference, length }
  return { ...signal, plates: [{ ...plate, force, offsetN, sums: own }], total: force, sums: own }
}

/** The same for two plates, with their total, whose running sums stay: they count from the first sample. */
function zeroTwo(signal: Signal, offsetOfA: number, offsetOfB: number): ZeroedSignal {
  const [plateA, plateB] = signal.plates
  const { length } = signal
  const rawA = plateA.force
  const rawB = plateB.force
  const { force: forceA, sums: sumsA } = slots(plateA.channel, length)
  const { force: forceB, sums: sumsB } = slots(plateB.channel, length)
  const total = borrow('zeroed total', length)
  const referenceA = rawA[0] - offsetOfA
  const referenceB = rawB[0] - offsetOfB
  let sumA = 0
  let sumB = 0
  sumsA[0] = 0
  sumsB[0] = 0
  for (let i = 0; i < length; i++) {
    const a = rawA[i] - offsetOfA
    const b = rawB[i] - offsetOfB
    forceA[i] = a
    forceB[i] = b
    total[i] = a + b
    sumA += a - referenceA
    sumB += b - referenceB
    sumsA[i + 1] = sumA
    sumsB[i + 1] = sumB
  }
  return {
    ...signal,
    plates: [
      { ...plateA, force: forceA, offsetN: offsetOfA, sums: { sums: sumsA, reference: referenceA, length } },
      { ...plateB, force: forceB, offsetN: offsetOfB, sums: { sums: sumsB, reference: referenceB, length } },
    ],
    total,
    sums: { ...signal.sums, reference: total[0] },
  }
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
  const zeroed =
    noises.length === 1 ? zeroOne(signal, noises[0].mean) : zeroTwo(signal, noises[0].mean, noises[1].mean)
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
