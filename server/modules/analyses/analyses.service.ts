import { createHash } from 'node:crypto'
import type { Analysis } from '../../../shared/contracts/trials.ts'
import { engineVersion } from '../../../shared/mechanics/version.ts'
import type { ClubContext, Tx } from '../../db/database.ts'
import type { MadeWith } from '../../db/schema/recomputes.ts'
import type { AnalysisInputs } from '../../db/schema/trials.ts'
import type { Deps } from '../../deps.ts'
import type { JobDeps } from '../../jobs/define-job.ts'
import { madeWithNow } from '../clubs/measuring.service.ts'
import { notify } from '../events/notify.ts'
import { rebuildWorking } from '../results/results.service.ts'
import {
  type AnalysisKey,
  findAnalysis,
  findAnalysisId,
  findSamples,
  findTrialToAnalyse,
  insertAnalysis,
  lockTrial,
  restoreAnalysis,
  type TrialRow,
} from './analyses.queries.ts'
import { type EngineSaid, toRow, toView } from './analysis-form.ts'
import { engineOptions, hashInputs, inputsOf, inputsText, settingsOf } from './inputs.ts'
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
  const work = await readTrial(deps, ctx, trialId)
  if (!work) return
  if (await deps.db.inClub(ctx, (tx) => findAnalysisId(tx, work.key))) {
    await deps.db.inClub(ctx, (tx) => makeCurrent(tx, work))
    return
  }
  const { samples, inputs } = work
  const task = { samples, options: engineOptions(inputs), settings: settingsOf(inputs) }
  const said = ofOneTrial(await deps.threads.analyseSamples(task))
  await deps.db.inClub(ctx, (tx) => keep(tx, work, said))
}

/** A trial as it was read, with the key that its analysis will have. */
interface Work {
  ctx: ClubContext
  key: AnalysisKey
  athleteId: string | null
  inputs: AnalysisInputs
  madeWith: MadeWith
  samples: Buffer
}

async function readTrial({ db }: Deps, ctx: ClubContext, trialId: string): Promise<Work | null> {
  const { clubId } = ctx
  const read = await db.inClub(ctx, async (tx) => {
    const trial = await findTrialToAnalyse(tx, clubId, trialId)
    if (!trial) return null
    const madeWith = await madeWithNow(tx, clubId)
    const samples = await findSamples(tx, clubId, trialId)
    return { athleteId: trial.athleteId, inputs: inputsOf(trial, madeWith), madeWith, samples }
  })
  if (!read) return null
  const key = { clubId, trialId, engineVersion, inputsHash: hashInputs(read.inputs, read.samples) }
  return { ctx, key, ...read }
}

/**
 * Locks the trial; null where it is not any more what it was when it was read, and a job of its own was sent. No job
 * follows a change of the club's settings or of the athlete's recorded mass: those stay as they were read.
 */
async function lockUnchanged(tx: Tx, work: Work): Promise<TrialRow | null> {
  const { key, inputs, madeWith, athleteId } = work
  await lockTrial(tx, key.clubId, key.trialId)
  const now = await findTrialToAnalyse(tx, key.clubId, key.trialId)
  if (!now || now.athleteId !== athleteId) return null
  const { recordedMassKg } = inputs
  return inputsText(inputsOf({ ...now, recordedMassKg }, madeWith)) === inputsText(inputs) ? now : null
}

/** Makes an analysis that was made before of the same inputs the current one, if it is not. */
async function makeCurrent(tx: Tx, work: Work): Promise<void> {
  const trial = await lockUnchanged(tx, work)
  const analysisId = trial && (await findAnalysisId(tx, work.key))
  if (!analysisId) return
  await restoreAnalysis(tx, work.key.clubId, work.key.trialId, analysisId)
  await tell(tx, work.ctx, trial)
}

/** Writes the analysis, unless the trial has changed since it was read, or another run wrote it first. */
async function keep(tx: Tx, work: Work, said: EngineSaid, key = work.key): Promise<void> {
  const trial = await lockUnchanged(tx, work)
  if (!trial || (await findAnalysisId(tx, work.key))) return
  if (key !== work.key && (await findAnalysisId(tx, key))) return
  await insertAnalysis(tx, { ...key, inputs: work.inputs, ...toRow(said) })
  await tell(tx, work.ctx, trial)
}

/** Says of a trial that its analysis failed every time, so that its sheet does not wait for ever. */
export async function giveUpAnalysing(deps: Deps, ctx: ClubContext, trialId: string): Promise<void> {
  const work = await readTrial(deps, ctx, trialId)
  if (!work) return
  // Another hash than the inputs' own: these inputs are still free to be analysed by a better engine.
  const inputsHash = createHash('sha256').update('given up').update(work.key.inputsHash).digest()
  await deps.db.inClub(ctx, (tx) => keep(tx, work, givenUp, { ...work.key, inputsHash }))
}

async function tell(tx: Tx, ctx: ClubContext, { sessionId, athleteId }: TrialRow): Promise<void> {
  await rebuildWorking(tx, ctx, sessionId, [athleteId])
  await notify(tx, ctx.clubId, { kind: 'session', id: sessionId })
}
