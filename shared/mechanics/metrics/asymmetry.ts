import { asymmetryFormulas } from '../../statistics/asymmetry/formulas.ts'
import type { Settings } from '../settings.ts'
import type { AsymmetryFigure } from '../types.ts'
import type { Budget, Quantity } from '../uncertainty/budget.ts'

/** Step of the numeric derivatives, as a part of both sides together. */
const stepShare = 1e-5

/**
 * Asymmetry of two feet by the formula of the settings, percent, above zero where the right is larger; its uncertainty
 * by how the formula moves with either side. `null` where the formula has no answer.
 */
export function asymmetryOf(
  budget: Budget,
  left: Quantity,
  right: Quantity,
  withoutU: boolean,
  { asymmetryFormula }: Pick<Settings, 'asymmetryFormula'>,
): AsymmetryFigure | null {
  const formula = asymmetryFormulas[asymmetryFormula]
  const [l, r] = [left.value, right.value]
  const value = formula(l, r)
  if (value === null) return null
  const step = stepShare * (Math.abs(l) + Math.abs(r))
  // At the edge of what the formula takes, the slope of its inner side stands for both.
  const slope = (at: (by: number) => number | null) => {
    const [above, below] = [at(step), at(-step)]
    return ((above ?? value) - (below ?? value)) / (above === null || below === null ? step : 2 * step)
  }
  const quantity = budget.on
    ? budget.pair(
        value,
        slope((by) => formula(l, r + by)),
        right,
        slope((by) => formula(l + by, r)),
        left,
      )
    : budget.exact(value)
  const { U, k, URepeat, kRepeat } = budget.figure(quantity, withoutU)
  const zeroWithin = U === null ? null : Math.abs(value) <= U
  return { value, U, k, URepeat, kRepeat, larger: value >= 0 ? 'right' : 'left', zeroWithin }
}
