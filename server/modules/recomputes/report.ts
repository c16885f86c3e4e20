import type { FigureMove, FigureOf, RecomputeReport } from '../../../shared/contracts/recomputes.ts'
import { metricKeys } from '../../../shared/mechanics/catalogue.ts'
import type { Tx } from '../../db/database.ts'
import type { FigureMoves, Moves } from '../../db/schema/recomputes.ts'
import { medianOf } from './bins.ts'
import { namesOfSessions, namesOfTrials } from './recomputes.queries.ts'

/** What moved, with the names that go with it: figures in the catalogue's order. */
export async function reportOf(tx: Tx, clubId: string, moves: Moves): Promise<RecomputeReport> {
  return {
    trials: moves.trials,
    trialsMoved: moves.trialsMoved,
    trialsFailed: moves.failed.length,
    figures: Object.entries(moves.figures)
      .map(([figure, of]) => toFigureMove(figure, of))
      .sort((a, b) => placeOf(a) - placeOf(b)),
    checks: moves.checks,
    publishedSessions: await publishedSessions(tx, clubId, moves),
    greatest: await greatest(tx, clubId, moves),
  }
}

function metricAndFoot(figure: string): { metric: string; of: FigureOf } {
  const [metric = '', of = 'both'] = figure.split('/')
  return { metric, of: of as FigureOf }
}

function toFigureMove(figure: string, moves: FigureMoves): FigureMove {
  const { moved, uMoved, appeared, vanished, greatestMultiple } = moves
  return {
    ...metricAndFoot(figure),
    moved,
    medianChange: medianOf(moves.changes),
    greatestChange: moved > 0 ? moves.greatest : null,
    medianMultiple: medianOf(moves.multiples),
    greatestMultiple,
    uMoved,
    medianUFactor: medianOf(moves.uFactors),
    appeared,
    vanished,
  }
}

const feet: readonly FigureOf[] = ['both', 'left', 'right', 'asymmetry']
function placeOf({ metric, of }: FigureMove): number {
  const known = (metricKeys as readonly string[]).indexOf(metric)
  return (known < 0 ? metricKeys.length : known) * feet.length + feet.indexOf(of)
}

async function publishedSessions(tx: Tx, clubId: string, { sessions }: Moves) {
  const ids = Object.keys(sessions).filter((id) => sessions[id].published > 0)
  if (ids.length === 0) return []
  const names = await namesOfSessions(tx, clubId, ids)
  return names.map((session) => ({ ...session, trials: sessions[session.id].published }))
}

async function greatest(tx: Tx, clubId: string, { greatest: moves }: Moves) {
  if (moves.length === 0) return []
  const names = await namesOfTrials(
    tx,
    clubId,
    moves.map(({ trialId }) => trialId),
  )
  const byId = new Map(names.map(({ id, ...name }) => [id, name]))
  return moves.flatMap(({ figure, ...move }) => {
    const name = byId.get(move.trialId)
    return name ? [{ ...name, ...metricAndFoot(figure), ...move }] : []
  })
}
