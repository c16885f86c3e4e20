import type { Estimate } from '../estimate.ts'
import { isMissing, type Missing } from '../missing.ts'
import { linearRegression, type LinearFit } from '../trend/linear-regression.ts'
import { whereLineMeets } from '../trend/where-line-meets.ts'

export interface LoadVelocityLine {
  /** Velocity (m/s) against load (kg): the slope is below zero where load slows the jump. `lineAt` reads it anywhere. */
  fit: LinearFit
  /** Velocity of the line without load, m/s. */
  velocityWithoutLoad: Estimate
  /** Load at which the line comes to a standstill, kg; a reason where the line does not fall clearly. */
  loadAtStandstill: Estimate | Missing
}

/**
 * Straight line of velocity against load (external load or system mass, the same throughout) by least squares, with
 * intervals for `coverage`. Both ends are extrapolated, and their intervals say what that costs. At least three jumps
 * with two loads. Loaded jumps give an all but straight line of force against velocity (Cuk et al. 2014, Eur J Appl
 * Physiol 114:1703–1714), and so of velocity against load.
 */
export function loadVelocityLine(
  loadsKg: readonly number[],
  velocities: readonly number[],
  coverage = 0.95,
): LoadVelocityLine | Missing {
  const fit = linearRegression(loadsKg, velocities, coverage)
  if (isMissing(fit)) return fit
  const falls = fit.slope.value < 0
  return {
    fit,
    velocityWithoutLoad: fit.intercept,
    loadAtStandstill: falls ? whereLineMeets(fit, 0, coverage) : { missing: 'slope-not-clear' },
  }
}
