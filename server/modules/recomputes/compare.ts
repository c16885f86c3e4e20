import type { Figure, Sides, TrialCheck } from '../../../shared/mechanics/types.ts'
import type { GreatestMove, Moves } from '../../db/schema/recomputes.ts'
import { countSize } from './bins.ts'
import { noFigureMoves } from './moves.ts'

type Uncertain = Pick<Figure, 'value' | 'U' | 'URepeat'>

/** What two analyses of a trial are compared by. */
export interface Compared {
  metrics: Record<string, Uncertain>
  sides: Sides | null
  checks: readonly TrialCheck[]
}

/** Relative size below which two figures are the same number, computed twice. */
const sameNumber = 1e-9

/** Adds one trial to `moves`: its figures and verdicts before and after. Says whether anything moved. */
export function compareTrial(moves: Moves, trialId: string, before: Compared, after: Compared): boolean {
  const old = figuresOf(before)
  const fresh = figuresOf(after)
  let moved = false
  let greatest: GreatestMove | null = null
  for (const figure of new Set([...old.keys(), ...fresh.keys()])) {
    const [was, is] = [old.get(figure), fresh.get(figure)]
    if (was && is && isSame(was.value, is.value) && isSame(was.U, is.U)) continue
    moved = true
    const multiple = countFigure((moves.figures[figure] ??= noFigureMoves()), was, is)
    if (was && is && multiple !== null && multiple > (greatest?.multiple ?? 0))
      greatest = { trialId, figure, before: was.value, after: is.value, multiple }
  }
  if (countVerdicts(moves, before.checks, after.checks)) moved = true
  if (greatest) moves.greatest.push(greatest)
  moves.trials += 1
  if (moved) moves.trialsMoved += 1
  return moved
}

const isSame = (a: number | null, b: number | null): boolean =>
  a === b || (a !== null && b !== null && Math.abs(a - b) <= sameNumber * Math.max(Math.abs(a), Math.abs(b)))

/** Counts a figure that moved; its change in multiples of URepeat, where both are known. */
function countFigure(
  moves: Moves['figures'][string],
  was: Uncertain | undefined,
  is: Uncertain | undefined,
): number | null {
  if (!was || !is) {
    if (is) moves.appeared += 1
    else moves.vanished += 1
    return null
  }
  if (!isSame(was.U, is.U)) {
    moves.uMoved += 1
    if (was.U !== null && is.U !== null) countSize(moves.uFactors, is.U / was.U)
  }
  if (isSame(was.value, is.value)) return null
  const change = is.value - was.value
  moves.moved += 1
  countSize(moves.changes, Math.abs(change))
  if (Math.abs(change) > Math.abs(moves.greatest)) moves.greatest = change
  const repeat = was.URepeat ?? is.URepeat
  if (!repeat) return null
  const multiple = Math.abs(change) / repeat
  countSize(moves.multiples, multiple)
  moves.greatestMultiple = Math.max(moves.greatestMultiple ?? 0, multiple)
  return multiple
}

/** By metric key; a foot's figure as `key/left`, `key/right`, the asymmetry as `key/asymmetry`. */
function figuresOf({ metrics, sides }: Compared): Map<string, Uncertain> {
  const figures = new Map(Object.entries(metrics))
  if (!sides) return figures
  for (const side of ['left', 'right', 'asymmetry'] as const) {
    for (const [key, figure] of Object.entries(sides[side])) figures.set(`${key}/${side}`, figure)
  }
  return figures
}

/** A check that is not there says nothing against the trial, as one that passed. */
function countVerdicts(
  { checks }: Moves,
  before: readonly TrialCheck[],
  after: readonly TrialCheck[],
): boolean {
  const verdictsOf = (list: readonly TrialCheck[]) => new Map(list.map(({ key, verdict }) => [key, verdict]))
  const [old, fresh] = [verdictsOf(before), verdictsOf(after)]
  let changed = false
  for (const key of new Set([...old.keys(), ...fresh.keys()])) {
    const [was, is] = [old.get(key) ?? 'pass', fresh.get(key) ?? 'pass']
    if (was === is) continue
    changed = true
    if (is === 'fail') checks.toFail += 1
    else if (was === 'fail') checks.fromFail += 1
    else checks.other += 1
  }
  return changed
}
