import type { FigureMoves, GreatestMove, Moves } from '../../db/schema/recomputes.ts'
import { addBins } from './bins.ts'

/** How many of the greatest moves are kept, one a trial. */
const keptMoves = 20

export const noMoves = (): Moves => ({
  trials: 0,
  trialsMoved: 0,
  failed: [],
  figures: {},
  checks: { toFail: 0, fromFail: 0, other: 0 },
  sessions: {},
  greatest: [],
})

export const noFigureMoves = (): FigureMoves => ({
  moved: 0,
  changes: {},
  greatest: 0,
  multiples: {},
  greatestMultiple: null,
  uMoved: 0,
  uFactors: {},
  appeared: 0,
  vanished: 0,
})

/** Adds what moved in some trials to what moved in others; `to` is changed. */
export function addMoves(to: Moves, from: Moves): void {
  to.trials += from.trials
  to.trialsMoved += from.trialsMoved
  to.failed.push(...from.failed)
  for (const [figure, moves] of Object.entries(from.figures))
    addFigure((to.figures[figure] ??= noFigureMoves()), moves)
  to.checks.toFail += from.checks.toFail
  to.checks.fromFail += from.checks.fromFail
  to.checks.other += from.checks.other
  for (const [session, { moved, published }] of Object.entries(from.sessions)) {
    const sum = (to.sessions[session] ??= { moved: 0, published: 0 })
    sum.moved += moved
    sum.published += published
  }
  to.greatest = greatestOf([...to.greatest, ...from.greatest])
}

function addFigure(to: FigureMoves, from: FigureMoves): void {
  to.moved += from.moved
  addBins(to.changes, from.changes)
  if (Math.abs(from.greatest) > Math.abs(to.greatest)) to.greatest = from.greatest
  addBins(to.multiples, from.multiples)
  if (from.greatestMultiple !== null)
    to.greatestMultiple = Math.max(to.greatestMultiple ?? 0, from.greatestMultiple)
  to.uMoved += from.uMoved
  addBins(to.uFactors, from.uFactors)
  to.appeared += from.appeared
  to.vanished += from.vanished
}

const greatestOf = (moves: GreatestMove[]): GreatestMove[] =>
  moves.sort((a, b) => b.multiple - a.multiple).slice(0, keptMoves)
