import type { Settings } from '../settings.ts'
import { effectiveSamples, estimateNoise, type Noise } from '../signal/noise.ts'
import { meanOver, type RunningSums } from '../signal/running-mean.ts'
import type { Stretch } from './unloaded.ts'

/** The stretch that is weighed in. */
export interface WeighingWindow {
  window: Stretch
  systemWeight: number
  /** SD of the samples in the window, N. */
  spread: number
}

/** The weighing: what the quiet stance before the jump says of the weight. */
export interface Weighing extends WeighingWindow {
  /** Quiet stance around the window, up to the movement. */
  stance: Stretch
  /** Standard error of the mean from noise, N, and its degrees of freedom. */
  noiseU: number
  noiseDof: number
  /** Standard uncertainty that slow sway adds, N, and its degrees of freedom. */
  swayU: number
  swayDof: number
}

/** Start of the window of `width` samples within [from, to) whose samples spread least. */
export function steadiestWindow(force: Float64Array, from: number, to: number, width: number): number {
  const reference = force[from]
  let sum = 0
  let squares = 0
  for (let i = from; i < from + width; i++) {
    const x = force[i] - reference
    sum += x
    squares += x * x
  }
  let least = squares - (sum * sum) / width
  let best = from
  for (let i = from + width; i < to; i++) {
    const entering = force[i] - reference
    const leaving = force[i - width] - reference
    sum += entering - leaving
    squares += entering * entering - leaving * leaving
    const spread = squares - (sum * sum) / width
    if (spread < least) {
      least = spread
      best = i - width + 1
    }
  }
  return best
}

/** Widens the window by blocks while their means stay at the weight. */
export function quietAround(
  sums: RunningSums,
  window: Stretch,
  limits: Stretch,
  weight: number,
  band: number,
  block: number,
): Stretch {
  let { from, to } = window
  while (from - block >= limits.from && Math.abs(meanOver(sums, from - block, from) - weight) < band)
    from -= block
  while (to + block <= limits.to && Math.abs(meanOver(sums, to, to + block) - weight) < band) to += block
  return { from, to }
}

function blockMeans(sums: RunningSums, stance: Stretch, block: number): Float64Array {
  const means = new Float64Array(Math.floor((stance.to - stance.from) / block))
  for (let k = 0; k < means.length; k++)
    means[k] = meanOver(sums, stance.from + k * block, stance.from + (k + 1) * block)
  return means
}

function spreadOf(force: Float64Array, { from, to }: Stretch): number {
  let sum = 0
  for (let i = from; i < to; i++) sum += force[i] - force[from]
  const mean = force[from] + sum / (to - from)
  let squares = 0
  for (let i = from; i < to; i++) squares += (force[i] - mean) * (force[i] - mean)
  return Math.sqrt(squares / Math.max(1, to - from - 1))
}

/**
 * Inflation of a mean by correlated blocks, with the first run of negative ρ after the positive one: a heartbeat or a
 * swing pays back in its second half what it added in its first. Slow noise in a short stance has negative ρ too,
 * because its own mean was taken off; so a part of the inflation stays in any case.
 */
function paidBack(blocks: Float64Array, noise: Noise, kept: number): number {
  let squares = 0
  for (let i = 0; i < blocks.length; i++) squares += (blocks[i] - noise.mean) * (blocks[i] - noise.mean)
  let inflation = noise.inflation
  for (let lag = noise.correlation.length; lag < blocks.length >> 1; lag++) {
    let product = 0
    for (let i = lag; i < blocks.length; i++)
      product += (blocks[i] - noise.mean) * (blocks[i - lag] - noise.mean)
    if (!(product < 0)) break
    inflation += (2 * product) / squares
  }
  return Math.max(1, kept * noise.inflation, inflation)
}

function unrestOf({ spread, systemWeight }: WeighingWindow): number {
  return spread / Math.abs(systemWeight)
}

/** Whether a search that ends at `to` would choose the same window: it is steady, and lies before. */
export function staysChosen(chosen: WeighingWindow, to: number, dt: number, settings: Settings): boolean {
  const { window } = chosen
  const isFull = window.to - window.from === Math.round(settings.weighingWindowS / dt)
  return isFull && window.to <= to && unrestOf(chosen) <= settings.steadinessCaution
}

/** The steadiest window of full length, or the longest shorter one that is steady; `null` if all are too short. */
export function chooseWindow(
  force: Float64Array,
  sums: RunningSums,
  limits: Stretch,
  dt: number,
  settings: Settings,
): WeighingWindow | null {
  const full = Math.round(settings.weighingWindowS / dt)
  const shortest = Math.max(8, settings.shortestWeighingS / dt)
  const available = limits.to - limits.from
  let steadiest: WeighingWindow | null = null
  let least = Infinity
  // Whatever the setting, every window is shorter than the one before, so that the search ends.
  const shrink = Math.min(0.99, settings.weighingShrink)
  for (let part = 1; ; part *= shrink) {
    const width = Math.min(available, Math.round(part * full))
    if (width < shortest) break
    const from = steadiestWindow(force, limits.from, limits.to, width)
    const window = { from, to: from + width }
    const chosen = {
      window,
      systemWeight: meanOver(sums, from, from + width),
      spread: spreadOf(force, window),
    }
    const unrest = unrestOf(chosen)
    if (unrest <= settings.steadinessCaution) return chosen
    if (unrest < settings.weighingSteadier * least) {
      steadiest = chosen
      least = unrest
    }
  }
  return steadiest
}

/**
 * Weighs: the mean over the steadiest window within `limits`. Its standard error takes the noise from the whole
 * quiet stance, because the steadiest window alone looks calmer than it is, and counts independent samples by the
 * autocorrelation; sway adds what it moves the mean. `null` where the limits are shorter than the shortest weighing.
 */
export function weigh(
  force: Float64Array,
  sums: RunningSums,
  limits: Stretch,
  gravity: number,
  plateNoise: Noise,
  dt: number,
  settings: Settings,
  inflationKept = settings.noiseInflationKept,
): Weighing | null {
  const chosen = chooseWindow(force, sums, limits, dt, settings)
  return chosen && weighIn(chosen, sums, limits, gravity, plateNoise, dt, settings, inflationKept)
}

/** The weighing in a window that was chosen already. */
export function weighIn(
  chosen: WeighingWindow,
  sums: RunningSums,
  limits: Stretch,
  gravity: number,
  plateNoise: Noise,
  dt: number,
  settings: Settings,
  inflationKept = settings.noiseInflationKept,
): Weighing {
  const { window, systemWeight } = chosen
  const width = window.to - window.from
  const block = Math.max(1, Math.round(settings.noiseBlockS / dt))
  const band = settings.onsetFraction * Math.abs(systemWeight)
  const stance = quietAround(sums, window, limits, systemWeight, band, 4 * block)

  const blocks = blockMeans(sums, stance, block)
  const noise = estimateNoise(blocks, 0, blocks.length)
  const blocksInWindow = width / block
  const plateU = plateNoise.sd * Math.sqrt(plateNoise.inflation / width)
  const inFull = noise.sd * Math.sqrt(noise.inflation / blocksInWindow)
  const noiseU = Math.max(
    noise.sd * Math.sqrt(paidBack(blocks, noise, inflationKept) / blocksInWindow),
    Math.min(inFull, plateU),
  )
  const noiseDof = Math.max(1, effectiveSamples(noise) - 1)

  // What stance wavers more than the empty plates is the body's own: at least what a slow sway would add.
  const bodyVariance = Math.max(0, noiseU * noiseU - plateU * plateU)
  const slowest = ((systemWeight / gravity) * settings.swayVelocityChange) / (width * dt)
  let swayU = Math.sqrt(Math.max(0, slowest * slowest - bodyVariance))
  let swayDof = Infinity
  if ((stance.to - stance.from) * dt >= settings.swayFromMeansS) {
    const means = blockMeans(sums, stance, width)
    const spread = spreadOf(means, { from: 0, to: means.length })
    swayU = Math.sqrt(Math.max(0, spread * spread - noiseU * noiseU))
    swayDof = means.length - 1
  }
  return { ...chosen, stance, noiseU, noiseDof, swayU, swayDof }
}
