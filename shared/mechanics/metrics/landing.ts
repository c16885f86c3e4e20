import type { MetricKey } from '../catalogue.ts'
import { velocityAtCrossing } from '../events/jump-events.ts'
import { comesToStay } from '../events/still.ts'
import { grossImpulse } from '../signal/gross-impulse.ts'
import { integratedNoise } from '../signal/noise.ts'
import { findPeak, type Peak } from '../signal/peak.ts'
import type { Quantity } from '../uncertainty/budget.ts'
import type { TrialTimes } from './event-times.ts'
import { velocityAtEvent } from './jump.ts'
import { at, displacementOf, forceOf, type TrialModel } from './trial-model.ts'
import { findRise, greatestSlope } from './loading-rate.ts'
import { miss, put, reasons, type Measured, type Outcome } from './measured.ts'

const peakKeys: MetricKey[] = [
  'landingPeakForce',
  'landingPeakForcePerBodyWeight',
  'landingFirstPeakForce',
  'timeToLandingPeak',
  'landingLoadingRateMean',
  'landingLoadingRateMeanPerBodyWeight',
  'landingLoadingRate2080',
  'landingLoadingRate2080PerBodyWeight',
  'landingLoadingRateMax',
  'landingLoadingRateMaxPerBodyWeight',
]
const motionKeys: MetricKey[] = ['landingImpulse', 'landingTime', 'landingDepth', 'landingStiffness']
const fixedKeys: MetricKey[] = [
  'landingImpulse50',
  'landingImpulse100',
  'landingVelocity',
  'timeToStabilisation',
]

/**
 * Position of the first maximum that the force falls away from by the asked prominence, above what a plate rings by at
 * the touch; the peak if none.
 */
function firstPeak(model: TrialModel, touchdown: number, peak: Peak): Peak {
  const { motion, settings, bodyWeight, zero, signal } = model
  const prominence = settings.firstPeakProminence * bodyWeight.value
  let highest = -Infinity
  let where = Math.ceil(touchdown)
  for (let i = where; i <= peak.position; i++) {
    if (motion.force[i] > highest) {
      highest = motion.force[i]
      where = i
    } else if (highest >= settings.touchRiseN && motion.force[i] < highest - prominence) {
      const around = 0.01 / signal.dt
      return findPeak(
        motion.force,
        Math.max(touchdown, where - around),
        where + around,
        1,
        zero.total,
        signal.dt,
        model.settings,
      )
    }
  }
  return peak
}

function perWeight(model: TrialModel, rate: Quantity): Quantity {
  return model.budget.over(rate, model.bodyWeight)
}

/** Slope between the 20 and 80 % crossings: both levels move with the peak. */
function rate2080(model: TrialModel, touchdown: number, peak: Peak, peakForce: Quantity): Outcome {
  const { budget, motion, zero, signal, settings } = model
  const rise = findRise(motion.force, touchdown, peak, zero.total, settings)
  if (!rise) return { missing: 'The force does not rise through 20 and 80 % of its peak after touchdown.' }
  const { low, high } = rise
  const share = settings.loadingRateHigh - settings.loadingRateLow
  const duration = (high.position - low.position) * signal.dt
  const rate = (share * peak.value) / duration
  const noise = budget.input(0, Math.hypot(low.positionU, high.positionU) * signal.dt)
  // The peak's own error moves the crossings; a zero or calibration error moves trace and levels together.
  const ownPeak = budget.input(0, peak.valueU)
  const lever = settings.loadingRateHigh / high.slope - settings.loadingRateLow / low.slope
  const quantity = budget.linear(rate, [
    [rate / peak.value, peakForce],
    [-rate / duration, noise],
    [(-rate / duration) * lever * signal.dt, ownPeak],
  ])
  return rise.doubt === null ? { quantity } : { quantity, withoutU: rise.doubt }
}

function rateMax(model: TrialModel, touchdown: number, peak: Peak): Outcome {
  const { budget, motion, zero, signal, settings } = model
  const found = greatestSlope(motion.force, touchdown, peak.position, settings.loadingRateWindowS / signal.dt)
  if (!found) return { missing: 'Too few samples lie between touchdown and the landing peak.' }
  const perSecond = found.slope / signal.dt
  const u = (found.slopeU * zero.total.sd * Math.sqrt(zero.total.inflation)) / signal.dt
  const gain = model.plates.map(({ gain: error }) => [perSecond / model.plates.length, error] as const)
  return { quantity: budget.linear(perSecond, [[1, budget.input(0, u)], ...gain]) }
}

/** Enters a landing figure and its twin per body weight. */
function withPerWeight(
  model: TrialModel,
  into: Measured,
  key: 'landingPeakForce' | 'landingLoadingRateMean' | 'landingLoadingRate2080' | 'landingLoadingRateMax',
  outcome: Outcome,
): void {
  into.set(key, outcome)
  const twin = 'missing' in outcome ? outcome : { ...outcome, quantity: perWeight(model, outcome.quantity) }
  into.set(`${key}PerBodyWeight`, twin)
}

function peakFigures(model: TrialModel, times: TrialTimes, into: Measured): void {
  const { budget, events } = model
  const { touchdown, landingPeak } = events
  if (!touchdown || !landingPeak || !times.touchdown || !times.landingPeak)
    return miss(into, peakKeys, reasons.noTouchdown)
  const peakForce = forceOf(model, landingPeak.value, landingPeak.position, landingPeak.valueU)
  const first = firstPeak(model, touchdown.position, landingPeak)
  const timeToPeak = budget.minus(times.landingPeak, times.touchdown)
  withPerWeight(model, into, 'landingPeakForce', { quantity: peakForce })
  put(into, 'landingFirstPeakForce', forceOf(model, first.value, first.position, first.valueU))
  put(into, 'timeToLandingPeak', timeToPeak)
  withPerWeight(model, into, 'landingLoadingRateMean', { quantity: budget.over(peakForce, timeToPeak) })
  withPerWeight(
    model,
    into,
    'landingLoadingRate2080',
    rate2080(model, touchdown.position, landingPeak, peakForce),
  )
  withPerWeight(model, into, 'landingLoadingRateMax', rateMax(model, touchdown.position, landingPeak))
}

function motionFigures(
  model: TrialModel,
  times: TrialTimes,
  landingVelocity: Quantity,
  into: Measured,
): void {
  const { budget, events, motion, settings, systemMass } = model
  const { touchdown, landingPeak, landingZeroVelocity } = events
  if (!touchdown || !times.touchdown || !landingPeak) return miss(into, motionKeys, reasons.noTouchdown)
  if (landingZeroVelocity === null || !times.landingZeroVelocity)
    return miss(into, motionKeys, reasons.noLandingEnd)
  const start = velocityAtCrossing(motion, touchdown, settings)
  const down = displacementOf(model, start)
  const lowest = displacementOf(model, at(model, landingZeroVelocity))
  const atPeak = displacementOf(model, at(model, landingPeak.position))
  const peakForce = forceOf(model, landingPeak.value, landingPeak.position, landingPeak.valueU)
  put(into, 'landingImpulse', budget.scaled(budget.times(systemMass, landingVelocity), -1))
  put(into, 'landingTime', budget.minus(times.landingZeroVelocity, times.touchdown))
  put(into, 'landingDepth', budget.minus(lowest, down))
  put(into, 'landingStiffness', budget.over(peakForce, budget.minus(down, atPeak)))
}

/** Gross impulse over a fixed window from touchdown; a late touchdown leaves some out and takes some in. */
function fixedImpulse(model: TrialModel, touchdown: Quantity, position: number, windowS: number): Outcome {
  const { budget, motion, sums, signal, plates, zero } = model
  const end = position + windowS / signal.dt
  if (end > signal.length - 1)
    return { missing: `The recording ends within ${windowS * 1000} ms of touchdown.` }
  const endForce = at(model, end).force
  const value = grossImpulse(motion.force, sums, position, end, signal.dt)
  return {
    quantity: budget.linear(value, [
      [endForce, touchdown],
      [1, budget.input(0, integratedNoise(zero.total, windowS, signal.dt))],
      ...plates.flatMap(({ offset, gain, force, sums: own }) => [
        [windowS, offset] as const,
        [grossImpulse(force, own, position, end, signal.dt), gain] as const,
      ]),
    ]),
  }
}

/** Touchdown to the force staying within the band about the weight for good; placed to the running mean's sharpness. */
function stabilisation(model: TrialModel, touchdown: Quantity, position: number): Outcome {
  const { budget, motion, sums, signal, settings } = model
  const { dt } = signal
  const half = Math.max(1, Math.round(settings.onsetSmoothingS / dt / 2))
  const hold = Math.floor(settings.stillWindowS / dt)
  const band = settings.stabilisationFraction * motion.systemWeight
  const stays = comesToStay(sums, motion.systemWeight, band, position, hold, half)
  if (stays === null) return { missing: reasons.noStill }
  return {
    quantity: budget.minus(budget.exact(stays * dt), touchdown),
    withoutU:
      'Where the force comes to stay near the weight is decided by the last swing, not by a smooth crossing.',
  }
}

/** Everything about the landing. */
export function landingFigures(model: TrialModel, times: TrialTimes, into: Measured): void {
  const { touchdown } = model.events
  const landingVelocity = touchdown && times.touchdown && velocityAtEvent(model, touchdown, times.touchdown)
  if (!touchdown || !times.touchdown || !landingVelocity)
    return miss(into, [...peakKeys, ...motionKeys, ...fixedKeys], reasons.noTouchdown)
  const { settings } = model
  const window = (windowS: number) =>
    fixedImpulse(model, times.touchdown as Quantity, touchdown.position, windowS)
  peakFigures(model, times, into)
  motionFigures(model, times, landingVelocity, into)
  put(into, 'landingVelocity', landingVelocity)
  into.set('landingImpulse50', window(settings.landingImpulseShortS))
  into.set('landingImpulse100', window(settings.landingImpulseLongS))
  into.set('timeToStabilisation', stabilisation(model, times.touchdown, touchdown.position))
}
