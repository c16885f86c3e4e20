import { tInterval, type Estimate } from '../estimate.ts'
import { tooFew, type Missing } from '../missing.ts'
import { meanOfScaled } from '../summary/mean.ts'
import { scaleToOne } from '../summary/scale-to-one.ts'

/** A fitted coefficient: its standard error and its confidence interval. */
export interface Coefficient extends Estimate {
  standardError: number
}

/** Straight line y = intercept + slope·x by ordinary least squares. */
export interface LinearFit {
  n: number
  /** Degrees of freedom of the residuals, n − 2. */
  dof: number
  slope: Coefficient
  intercept: Coefficient
  /** Standard deviation of the residuals, √(SSR/(n − 2)), in the unit of y. */
  residualSd: number
  /** Share of the variance of y that the line explains; null where y has none. */
  rSquared: number | null
  meanX: number
  meanY: number
  /** Root of Σ(x − x̄)². */
  spreadX: number
}

const dot = (a: readonly number[], b: readonly number[]) => a.reduce((sum, value, i) => sum + value * b[i], 0)

function centre(values: readonly number[]): { mean: number; deviations: number[]; factor: number } | null {
  const scaled = scaleToOne(values)
  if (!scaled) return null
  const mean = meanOfScaled(scaled.values)
  return { mean, deviations: scaled.values.map((value) => value - mean), factor: scaled.factor }
}

/**
 * Fits a straight line by least squares about the means, with t intervals for `coverage` (Draper, Smith 1998, Applied
 * Regression Analysis, 3rd ed., ch. 1): SE of the slope s/√Sxx, of the intercept s·√(1/n + x̄²/Sxx). At least three
 * points, for two leave nothing to tell the error from, and x not all the same.
 */
export function linearRegression(
  xs: readonly number[],
  ys: readonly number[],
  coverage = 0.95,
): LinearFit | Missing {
  const n = xs.length
  if (n !== ys.length) return { missing: 'unequal-lengths' }
  if (n < 3) return tooFew(n, 3)
  const [x, y] = [centre(xs), centre(ys)]
  if (!x || !y) return { missing: 'not-finite' }
  const sxx = dot(x.deviations, x.deviations)
  if (sxx === 0) return { missing: 'no-spread' }
  const slope = dot(x.deviations, y.deviations) / sxx
  const residuals = y.deviations.map((value, i) => value - slope * x.deviations[i])
  const ssr = dot(residuals, residuals)
  const syy = dot(y.deviations, y.deviations)
  const sd = Math.sqrt(ssr / (n - 2))
  const coefficient = (value: number, error: number, unit: number): Coefficient => ({
    standardError: error * unit,
    ...tInterval(value * unit, error * unit, n - 2, coverage),
  })
  const interceptError = sd * Math.sqrt(1 / n + x.mean ** 2 / sxx)
  const fit = {
    n,
    dof: n - 2,
    slope: coefficient(slope, sd / Math.sqrt(sxx), y.factor / x.factor),
    intercept: coefficient(y.mean - slope * x.mean, interceptError, y.factor),
    residualSd: sd * y.factor,
    rSquared: syy === 0 ? null : Math.max(0, 1 - ssr / syy),
    meanX: x.mean * x.factor,
    meanY: y.mean * y.factor,
    spreadX: Math.sqrt(sxx) * x.factor,
  }
  return [...Object.values(fit.slope), ...Object.values(fit.intercept)].every(Number.isFinite)
    ? fit
    : { missing: 'not-finite' }
}
