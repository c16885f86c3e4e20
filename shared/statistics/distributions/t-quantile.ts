import { cornishFisherT } from './cornish-fisher-t.ts'
import { fUpperQuantile } from './f-quantile.ts'
import { normalQuantile } from './normal-quantile.ts'
import { checkProbability } from './probability.ts'

/** From here on three terms of the series leave less than rounding does. */
const SERIES_FROM = 1e5

/**
 * Quantile of Student's t distribution: the value below which a share p lies. `dof` at least 0.1, whole or not, may be
 * infinite. t² is an F variate with 1 and dof degrees of freedom.
 */
export function tQuantile(p: number, dof: number): number {
  checkProbability(p, dof)
  if (p === 0.5) return 0
  if (dof >= SERIES_FROM) return cornishFisherT(normalQuantile(p), dof)
  const t = Math.sqrt(fUpperQuantile(2 * Math.min(p, 1 - p), 1, dof))
  return p < 0.5 ? -t : t
}
