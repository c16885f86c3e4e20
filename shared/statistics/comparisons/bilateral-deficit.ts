import { arePositive, combineU, type Measured } from '../measured.ts'

/**
 * Bilateral deficit (1 − B/(L + R))·100 %: above zero where both legs together reach less than the two single-leg jumps
 * add up to, below zero (facilitation) where they reach more. It is the bilateral index of Howard, Enoka 1991 (J Appl
 * Physiol 70:306–316, from memory) with its sign turned. null unless all are above zero.
 */
export function bilateralDeficit(left: Measured, right: Measured, both: Measured): Measured | null {
  const single = left.value + right.value
  const share = both.value / single
  if (!arePositive(left, right, both) || !Number.isFinite(share)) return null
  const U = combineU([
    [(100 * share) / single, left.U],
    [(100 * share) / single, right.U],
    [100 / single, both.U],
  ])
  return { value: 100 * (1 - share), U }
}
