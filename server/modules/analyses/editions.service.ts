import type { AnalysisEdition } from '../../../shared/contracts/analyses.ts'
import { sheetMetrics } from '../../../shared/contracts/sheet-metrics.ts'
import type { Deps } from '../../deps.ts'
import type { Caller } from '../../http/caller.ts'
import { notFound } from '../../http/errors.ts'
import { analysesOfTrial, type EditionRow, isTrial } from './editions.queries.ts'

/** Every analysis of a trial, the one in force and those it took the place of. */
export function listEditions(
  { db }: Pick<Deps, 'db'>,
  ctx: Caller,
  trialId: string,
): Promise<{ analyses: AnalysisEdition[] }> {
  return db.inClub(ctx, async (tx) => {
    if (!(await isTrial(tx, ctx.clubId, trialId))) throw notFound('This trial')
    return { analyses: (await analysesOfTrial(tx, ctx.clubId, trialId)).map(toEdition) }
  })
}

function toEdition({ id, createdAt, engineVersion, supersededAt, inputs, published, ...said }: EditionRow) {
  const { settings, changedSettings = {}, gravity, calibrationU, recordedMassKg, movedEvents = {} } = inputs
  const shown = sheetMetrics.filter((key) => said.metricValues[key] !== undefined)
  return {
    id,
    madeAt: createdAt.toISOString(),
    engineVersion,
    current: supersededAt === null,
    published,
    settings,
    changedSettings,
    gravity,
    calibrationU,
    recordedMassKg,
    movedEvents: Object.keys(movedEvents),
    figures: Object.fromEntries(
      shown.map((key) => [
        key,
        { value: said.metricValues[key], U: said.metricUncertainties[key]?.[0] ?? null },
      ]),
    ),
    fails: said.checks.filter(({ verdict }) => verdict === 'fail').length,
  }
}
