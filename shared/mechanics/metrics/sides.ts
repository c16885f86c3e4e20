import type { MetricKey } from '../catalogue.ts'
import type { Figure, Phase, Sides } from '../types.ts'
import { fitFlank, type Crossing } from '../events/flank.ts'
import type { PhaseSpan } from '../phases.ts'
import { grossImpulse } from '../signal/gross-impulse.ts'
import { integratedNoise, type Noise } from '../signal/noise.ts'
import { findPeak } from '../signal/peak.ts'
import type { Quantity } from '../uncertainty/budget.ts'
import { isSide, type TrialModel, type PlateInputs } from './trial-model.ts'
import { asymmetryOf } from './asymmetry.ts'
import { findRise, greatestSlope } from './loading-rate.ts'
import { miss, put, type Measured, type Outcome } from './measured.ts'

/** One foot: its plate's inputs, its noise, and its own takeoff and touchdown. */
export interface Foot {
  plate: PlateInputs
  noise: Noise
  takeoff: Crossing | null
  touchdown: Crossing | null
}

const perPhase: Partial<Record<Phase, { gross: MetricKey; mean?: MetricKey; peak?: MetricKey }>> = {
  unweighting: { gross: 'unweightingGrossImpulse' },
  braking: { gross: 'brakingGrossImpulse', mean: 'meanBrakingForce', peak: 'peakBrakingForce' },
  propulsion: { gross: 'propulsionGrossImpulse', mean: 'meanPropulsionForce', peak: 'peakPropulsionForce' },
  landing: { gross: 'landingGrossImpulse', mean: 'meanLandingForce', peak: 'landingPeakForce' },
}

/** Sample at which a plate's force first falls (or last fell) under a threshold near the total's event. */
function edgeNear(
  force: Float64Array,
  around: number,
  reach: number,
  threshold: number,
  rising: boolean,
): number | null {
  if (rising) {
    for (let i = Math.max(1, Math.floor(around - 2)); i <= Math.min(force.length - 1, around + reach); i++)
      if (force[i] >= threshold) return i
    return null
  }
  for (let i = Math.min(force.length - 1, Math.ceil(around + 2)); i >= Math.max(1, around - reach); i--)
    if (force[i - 1] >= threshold) return i
  return null
}

/** The feet of a trial on two plates, left first; `null` with one plate. */
export function findFeet(model: TrialModel): [Foot, Foot] | null {
  const { plates, zero, events, signal, settings } = model
  if (plates.length !== 2 || !plates.every(({ channel }) => isSide(channel))) return null
  const reach = settings.unloadedWindowS / signal.dt
  const feet = plates.map((plate, i): Foot => {
    const noise = zero.plates[i]
    const threshold = Math.max(settings.eventForceN, settings.unloadedSd * noise.sd)
    const place = (around: number, rising: boolean) => {
      const edge = edgeNear(plate.force, around, reach, threshold, rising)
      return edge === null
        ? null
        : fitFlank(plate.force, edge, rising ? 'rising' : 'falling', noise, signal.dt, settings)
    }
    return {
      plate,
      noise,
      takeoff: events.takeoff && place(events.takeoff.position, false),
      touchdown: events.touchdown && place(events.touchdown.position, true),
    }
  })
  return [feet[0], feet[1]]
}

/** A force of one foot: noise of its own, its plate's zero and calibration. */
function footForce({ budget }: TrialModel, foot: Foot, value: number, u: number): Quantity {
  return budget.linear(value, [
    [1, budget.input(0, u)],
    [1, foot.plate.offset],
    [value, foot.plate.gain],
  ])
}

function footImpulse(model: TrialModel, foot: Foot, from: number, to: number): Quantity {
  const { budget, signal } = model
  const duration = (to - from) * signal.dt
  const value = grossImpulse(foot.plate.force, foot.plate.sums, from, to, signal.dt)
  return budget.linear(value, [
    [1, budget.input(0, integratedNoise(foot.noise, duration, signal.dt))],
    [duration, foot.plate.offset],
    [value, foot.plate.gain],
  ])
}

/** A loading rate of one foot: calibration, its peak's own error, and the error of its duration. */
function footRate(
  { budget }: TrialModel,
  foot: Foot,
  rate: number,
  peakU: number,
  durationU: number,
): Quantity {
  return budget.linear(rate, [
    [rate, foot.plate.gain],
    [rate, budget.input(0, Math.hypot(peakU, durationU))],
  ])
}

function loadingRates(model: TrialModel, foot: Foot, landingEnd: number, into: Measured): void {
  const { budget, signal, settings } = model
  if (!foot.touchdown)
    return miss(
      into,
      ['landingLoadingRateMean', 'landingLoadingRate2080', 'landingLoadingRateMax'],
      'This foot has no touchdown of its own.',
    )
  const { force } = foot.plate
  const start = foot.touchdown.position
  const peak = findPeak(force, start, landingEnd, 1, foot.noise, signal.dt, model.settings)
  const peakU = peak.valueU / peak.value
  const toPeak = peak.position - start
  const toPeakU = Math.hypot(peak.positionU, foot.touchdown.positionU) / toPeak
  const mean = peak.value / (toPeak * signal.dt)
  if (toPeak > 0) put(into, 'landingLoadingRateMean', footRate(model, foot, mean, peakU, toPeakU))

  const rise = findRise(force, start, peak, foot.noise, settings)
  if (rise) {
    const duration = rise.high.position - rise.low.position
    const durationU = Math.hypot(rise.low.positionU, rise.high.positionU) / duration
    const rate = ((settings.loadingRateHigh - settings.loadingRateLow) * peak.value) / (duration * signal.dt)
    const quantity = footRate(model, foot, rate, peakU, durationU)
    into.set(
      'landingLoadingRate2080',
      rise.doubt === null ? { quantity } : { quantity, withoutU: rise.doubt },
    )
  } else miss(into, ['landingLoadingRate2080'], 'The force does not rise through 20 and 80 % of its peak.')

  const steepest = greatestSlope(force, start, peak.position, settings.loadingRateWindowS / signal.dt)
  if (!steepest) return
  const rate = steepest.slope / signal.dt
  const u = (steepest.slopeU * foot.noise.sd * Math.sqrt(foot.noise.inflation)) / signal.dt
  put(into, 'landingLoadingRateMax', budget.pair(rate, 1, budget.input(0, u), rate, foot.plate.gain))
}

/** Every figure of one foot, over the phases of the total. */
function footFigures(model: TrialModel, foot: Foot, phases: readonly PhaseSpan[]): Measured {
  const { signal, budget, weighing } = model
  const into: Measured = new Map()
  if (weighing) {
    const windowS = (weighing.window.to - weighing.window.from) * signal.dt
    const stanceU = integratedNoise(foot.noise, windowS, signal.dt) / windowS
    put(into, 'stanceForce', footForce(model, foot, foot.plate.stanceForce, stanceU))
  }
  for (const { phase, from, to } of phases) {
    const keys = perPhase[phase]
    if (!keys) continue
    const gross = footImpulse(model, foot, from, to)
    put(into, keys.gross, gross)
    if (keys.mean) put(into, keys.mean, budget.scaled(gross, 1 / ((to - from) * signal.dt)))
    if (keys.peak) {
      const peak = findPeak(foot.plate.force, from, to, 1, foot.noise, signal.dt, model.settings)
      put(into, keys.peak, footForce(model, foot, peak.value, peak.valueU))
    }
    if (phase === 'landing') loadingRates(model, foot, to, into)
  }
  return into
}

/** How much later an event of the right foot is than that of the left. */
function lagOf(
  { budget, signal }: TrialModel,
  [left, right]: [Foot, Foot],
  event: 'takeoff' | 'touchdown',
): Outcome {
  const [a, b] = [left[event], right[event]]
  if (!a || !b) return { missing: 'A foot has no event of its own here.' }
  const u = Math.hypot(a.positionU, b.positionU) * signal.dt
  return {
    quantity: budget.linear((b.position - a.position) * signal.dt, [
      [1, budget.input(0, u)],
      [-signal.dt / b.slope, right.plate.offset],
      [signal.dt / a.slope, left.plate.offset],
    ]),
  }
}

/** Lag of the feet where they touch down, right less left. */
export function touchdownLag(model: TrialModel, feet: [Foot, Foot], into: Measured): void {
  into.set('feetTouchdownLag', lagOf(model, feet, 'touchdown'))
}

/** Lags of the feet at takeoff and touchdown, right less left. */
export function lagFigures(model: TrialModel, feet: [Foot, Foot], into: Measured): void {
  into.set('feetTakeoffLag', lagOf(model, feet, 'takeoff'))
  touchdownLag(model, feet, into)
}

/** Figures of each foot and their asymmetry. */
export function sidesOf(model: TrialModel, feet: [Foot, Foot], phases: readonly PhaseSpan[]): Sides {
  const [left, right] = feet.map((foot) => footFigures(model, foot, phases))
  const sides: Sides = { left: {}, right: {}, asymmetry: {} }
  const enter = (into: Record<string, Figure>, key: string, outcome: Outcome) => {
    if ('quantity' in outcome)
      into[key] = model.budget.figure(outcome.quantity, outcome.withoutU !== undefined)
  }
  for (const [key, a] of left) {
    const b = right.get(key)
    if (!b) continue
    enter(sides.left, key, a)
    enter(sides.right, key, b)
    if (!('quantity' in a) || !('quantity' in b)) continue
    const withoutU = a.withoutU !== undefined || b.withoutU !== undefined
    const asymmetry = asymmetryOf(model.budget, a.quantity, b.quantity, withoutU, model.settings)
    if (asymmetry) sides.asymmetry[key] = asymmetry
  }
  return sides
}
