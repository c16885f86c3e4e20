import { createHash } from 'node:crypto'
import type { Analysis } from '../../../shared/contracts/trials.ts'
import { engineVersion } from '../../../shared/mechanics/version.ts'
import type { ClubContext, Tx } from '../../db/database.ts'
import type { Deps } from '../../deps.ts'
import type { JobDeps } from '../../jobs/define-job.ts'
import { notify } from '../events/notify.ts'
import { rebuildWorking } from '../results/results.service.ts'
import {
  findAnalysis,
  findAnalysisId,
  findTrialToAnalyse,
  insertAnalysis,
  lockTrial,
  restoreAnalysis,
  type TrialRow,
} from './analyses.queries.ts'
import { type EngineSaid, toRow, toView } from './analysis-form.ts'
import { engineOptions, hashInputs, inputsOf } from './inputs.ts'
import { givenUp, ofOneTrial } from './without-figures.ts'

/** A trial's current analysis, or the pinned one. */
export async function viewAnalysis(
  tx: Tx,
  clubId: string,
  which: { trialId: string } | { analysisId: string },
): Promise<Analysis | null> {
  const row = await findAnalysis(tx, clubId, which)
  return row && toView(row)
}

/**
 * Analyses a trial as it stands and makes that its current analysis. Safe to run twice and by two workers at
 * once: the same inputs are the same row, and inputs that changed meanwhile have sent a job of their own.
 */
export async function analyseTrial(deps: JobDeps, ctx: ClubContext, trialId: string): Promise<void> {
  const trial = await deps.db.inClub(ctx, (tx) => findTrialToAnalyse(tx, ctx.clubId, trialId))
  if (!trial) return
  const known = await deps.db.inClub(ctx, (tx) => keepKnown(tx, ctx, trialId, keyOf(ctx, trialId, trial)))
  if (known) return
  const options = engineOptions(inputsOf(trial))
  const answer = await deps.threads.analyseSamples({ samples: trial.samples, options })
  await deps.db.inClub(ctx, (tx) => keep(tx, ctx, trialId, { before: trial, said: ofOneTrial(answer) }))
}

function keyOf({ clubId }: ClubContext, trialId: string, trial: TrialRow) {
  return { clubId, trialId, engineVersion, inputsHash: hashInputs(inputsOf(trial), trial.samples) }
}

/** True where these inputs were analysed before; that analysis is made current if it is not. */
async function keepKnown(
  tx: Tx,
  ctx: ClubContext,
  trialId: string,
  key: ReturnType<typeof keyOf>,
): Promise<boolean> {
  await lockTrial(tx, ctx.clubId, trialId)
  const trial = await findTrialToAnalyse(tx, ctx.clubId, trialId)
  const analysisId = await findAnalysisId(tx, key)
  if (!analysisId || !trial || !keyOf(ctx, trialId, trial).inputsHash.equals(key.inputsHash)) return false
  await restoreAnalysis(tx, ctx.clubId, trialId, analysisId)
  await tell(tx, ctx, trial)
  return true
}

/** Writes the analysis, unless the trial has changed since it was read, or another run wrote it first. */
async function keep(
  tx: Tx,
  ctx: ClubContext,
  trialId: string,
  { before, said }: { before: TrialRow; said: EngineSaid },
): Promise<void> {
  await lockTrial(tx, ctx.clubId, trialId)
  const now = await findTrialToAnalyse(tx, ctx.clubId, trialId)
  const key = keyOf(ctx, trialId, before)
  if (!now || !keyOf(ctx, trialId, now).inputsHash.equals(key.inputsHash)) return
  if (await findAnalysisId(tx, key)) return
  await insertAnalysis(tx, { ...key, inputs: inputsOf(before), ...toRow(said) })
  await tell(tx, ctx, now)
}

/** Says of a trial that its analysis failed every time, so that its sheet does not wait for ever. */
export async function giveUpAnalysing(deps: Deps, ctx: ClubContext, trialId: string): Promise<void> {
  await deps.db.inClub(ctx, async (tx) => {
    await lockTrial(tx, ctx.clubId, trialId)
    const trial = await findTrialToAnalyse(tx, ctx.clubId, trialId)
    if (!trial) return
    const key = keyOf(ctx, trialId, trial)
    // Another hash than the inputs' own: these inputs are still free to be analysed by a better engine.
    const failed = {
      ...key,
      inputsHash: createHash('sha256').update('given up').update(key.inputsHash).digest(),
    }
    if ((await findAnalysisId(tx, key)) || (await findAnalysisId(tx, failed))) return
    await insertAnalysis(tx, { ...failed, inputs: inputsOf(trial), ...toRow(givenUp) })
    await tell(tx, ctx, trial)
  })
}

async function tell(tx: Tx, ctx: ClubContext, { sessionId, athleteId }: TrialRow): Promise<void> {
  await rebuildWorking(tx, ctx, sessionId, [athleteId])
  await notify(tx, ctx.clubId, { kind: 'session', id: sessionId })
}
