import { studentT } from './distributions/student-t.ts'
import type { PooledSpread } from './pooled-spread.ts'

/** One trial's figure: its expanded uncertainty for about 95 %, and the part of it that differs from trial to trial. */
export interface TrialFigure {
  value: number
  U: number | null
  URepeat: number | null
}

export interface Mean {
  value: number
  /** For about 95 %; null where neither the plate nor the spread says anything. */
  U: number | null
  trials: number
}

const COVERAGE = 0.95

/**
 * The mean of a session's trials, with the larger of two uncertainties that answer different questions and are
 * never added up: how well the plate knows the mean, and how well so few of the athlete's trials know it.
 * `spread` is what trials of the session vary within an athlete, null where nobody has two. null without a trial.
 */
export function meanOfTrials(figures: readonly TrialFigure[], spread: PooledSpread | null): Mean | null {
  const n = figures.length
  if (n === 0) return null
  const value = figures.reduce((sum, figure) => sum + figure.value, 0) / n
  const known = [plateU(figures), spreadU(n, spread)].filter((U) => U !== null)
  return { value, U: known.length > 0 ? Math.max(...known) : null, trials: n }
}

/**
 * What the plate says of the mean. The repeatable part averages out, √(ΣU²)/n; the rest (calibration, gravity) is
 * the same in every trial and does not shrink (GUM 5.2.2: fully correlated inputs add up linearly).
 */
function plateU(figures: readonly TrialFigure[]): number | null {
  const n = figures.length
  let repeat = 0
  let same = 0
  for (const { U, URepeat } of figures) {
    if (U === null || URepeat === null) return null
    repeat += URepeat * URepeat
    same += Math.sqrt(Math.max(0, U * U - URepeat * URepeat))
  }
  return Math.hypot(Math.sqrt(repeat) / n, same / n)
}

/** What the spread from trial to trial says of a mean of n: t·s/√n (GUM 4.2 and G.3). */
function spreadU(n: number, spread: PooledSpread | null): number | null {
  return spread && (studentT(COVERAGE, spread.degreesOfFreedom) * spread.sd) / Math.sqrt(n)
}
