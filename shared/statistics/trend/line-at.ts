import { tInterval, type Estimate } from '../estimate.ts'
import type { LinearFit } from './linear-regression.ts'

/**
 * The line itself at x, with the confidence interval of the mean there: s·√(1/n + (x − x̄)²/Sxx) (Draper, Smith 1998,
 * ch. 3). A single new observation scatters more.
 */
export function lineAt(fit: LinearFit, x: number, coverage = 0.95): Estimate {
  const distance = (x - fit.meanX) / fit.spreadX
  const error = fit.residualSd * Math.sqrt(1 / fit.n + distance * distance)
  return tInterval(fit.meanY + fit.slope.value * (x - fit.meanX), error, fit.dof, coverage)
}
