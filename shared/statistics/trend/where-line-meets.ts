import { tQuantile } from '../distributions/t-quantile.ts'
import type { Estimate } from '../estimate.ts'
import type { Missing } from '../missing.ts'
import type { LinearFit } from './linear-regression.ts'

/**
 * The x at which a fitted line takes the value y, with the limits between which the confidence band of the line takes it
 * (Fieller 1954, J R Stat Soc B 16:175–185): with b the slope and g = (t·SE_b/b)²,
 * x̄ + [d ± (t·s/|b|)·√(d²/Sxx + (1 − g)/n)]/(1 − g), d the distance of the crossing from x̄. Where zero is within the
 * interval of the slope (g ≥ 1) the band never ends: a reason instead.
 */
export function whereLineMeets(fit: LinearFit, y: number, coverage = 0.95): Estimate | Missing {
  const slope = fit.slope.value
  const t = tQuantile((1 + coverage) / 2, fit.dof)
  const g = ((t * fit.slope.standardError) / slope) ** 2
  if (!(g < 1)) return { missing: 'slope-not-clear' }
  const distance = (y - fit.meanY) / slope
  const root = Math.sqrt((distance / fit.spreadX) ** 2 + (1 - g) / fit.n)
  const half = ((t * fit.residualSd) / Math.abs(slope)) * root
  return {
    value: fit.meanX + distance,
    low: fit.meanX + (distance - half) / (1 - g),
    high: fit.meanX + (distance + half) / (1 - g),
  }
}
