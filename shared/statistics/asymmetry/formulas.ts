import { bilateralShare } from './bilateral-share.ts'
import { logRatio } from './log-ratio.ts'
import { percentageDifference } from './percentage-difference.ts'
import { symmetryAngle } from './symmetry-angle.ts'
import { symmetryIndex } from './symmetry-index.ts'

/**
 * The signed formulas by key, for a setting to choose from: percent, above zero where the right side is larger, null
 * where there is no answer. They are not on one scale: never compare figures of two of them. The limb symmetry index
 * asks which limb is the involved one, and is not among them.
 */
export const asymmetryFormulas = {
  symmetryIndex,
  bilateralShare,
  percentageDifference: (left: number, right: number) => percentageDifference(left, right),
  symmetryAngle,
  logRatio,
} as const satisfies Record<string, (left: number, right: number) => number | null>

export type AsymmetryFormula = keyof typeof asymmetryFormulas
