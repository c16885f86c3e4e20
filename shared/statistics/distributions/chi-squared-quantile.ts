import { gammaLogDensity, lowerGamma, upperGamma } from './incomplete-gamma.ts'
import { invertShare } from './invert-share.ts'
import { checkProbability } from './probability.ts'

/**
 * Quantile of the χ² distribution: the value below which a share p lies. `dof` at least 0.1, finite, whole or not.
 * χ² is twice a gamma variate of shape dof/2; solved for its logarithm.
 */
export function chiSquaredQuantile(p: number, dof: number): number {
  checkProbability(p, dof)
  const shape = dof / 2
  const start = Math.log(shape)
  if (p <= 0.5) {
    const share = (u: number) => lowerGamma(shape, Math.exp(u))
    return 2 * Math.exp(invertShare(p, share, (u) => gammaLogDensity(shape, Math.exp(u)), start))
  }
  // The upper share rises along −u.
  const share = (u: number) => upperGamma(shape, Math.exp(-u))
  return 2 * Math.exp(-invertShare(1 - p, share, (u) => gammaLogDensity(shape, Math.exp(-u)), -start))
}
