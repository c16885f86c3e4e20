import { ReadFault } from '../errors.ts'
import { readingNotes } from '../notes.ts'
import type { Note } from '../../mechanics/types.ts'
import type { ForceUnit, MappedForce } from '../column-map.ts'
import type { ReadHints } from '../hints.ts'
import { listed } from '../safe-text.ts'
import type { Metadata } from '../table/metadata.ts'
import { standardGravity } from '../../units/gravity.ts'

/** Newtons in one pound-force: the weight of 0.45359237 kg under standard gravity, exact. */
const POUND_FORCE_N = 0.45359237 * standardGravity

/** Newtons in one of each unit, and what was assumed for it. */
export interface UnitFactors {
  factorOf: (unit: ForceUnit) => number
  notes: Note[]
}

/**
 * @throws ReadFault `body-weight-unknown` for forces in body weights without a mass
 */
export function unitFactors(
  forces: readonly MappedForce[],
  metadata: Metadata,
  hints: ReadHints,
): UnitFactors {
  const relative = forces.find(({ unit }) => unit === 'BW' || unit === '%BW')
  const massKg = metadata.bodyMassKg ?? hints.bodyMassKg
  if (relative && massKg === undefined) {
    const sentence = `The column ${listed([relative.name])} is in body weights, and the athlete’s mass is not known.`
    throw new ReadFault('body-weight-unknown', sentence, { column: relative.index + 1 })
  }
  const weightN = (massKg ?? NaN) * standardGravity
  const factors: Record<ForceUnit, number> = {
    N: 1,
    kN: 1000,
    kgf: standardGravity,
    lbf: POUND_FORCE_N,
    BW: weightN,
    '%BW': weightN / 100,
  }
  const stated = metadata.bodyMassKg === undefined ? 'hint' : 'file'
  const notes = relative && massKg !== undefined ? [readingNotes.fromBodyWeights(massKg, stated)] : []
  return { factorOf: (unit) => factors[unit], notes }
}
