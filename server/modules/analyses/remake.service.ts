import { engineVersion } from '../../../shared/mechanics/version.ts'
import type { ClubContext, Tx } from '../../db/database.ts'
import type { MadeWith } from '../../db/schema/recomputes.ts'
import type { AnalysisInputs } from '../../db/schema/trials.ts'
import type { JobDeps } from '../../jobs/define-job.ts'
import type { AnalyseSamples } from '../../jobs/threads/tasks.ts'
import { rebuildWorkingOf } from '../results/results.service.ts'
import { type EngineSaid, figuresOf, toRow } from './analysis-form.ts'
import { engineOptions, hashInputs, remadeWith, settingsOf } from './inputs.ts'
import {
  analysesByEngine,
  countStale,
  type EarlierAnalysis,
  insertAnalyses,
  lockTrials,
  restoreAll,
  staleTrials,
  supersedeAll,
  type TrialScope,
  type TrialToRemake,
  trialsToRemake,
} from './remake.queries.ts'
import { ofOneTrial } from './without-figures.ts'

type Compared = ReturnType<typeof figuresOf>

/** An analysis made again, or found among the earlier ones, in place of a trial's current one. Nothing is stored yet. */
export interface Remade {
  trialId: string
  sessionId: string
  athleteId: string | null
  /** An athlete reads the trial, as it was published. */
  published: boolean
  before: Compared
  after: Compared
  /** Its place in the database. */
  currentId: string
  made: { inputs: AnalysisInputs; inputsHash: Buffer; said: EngineSaid } | { earlierId: string }
}

/** How many of the scope's analyses were made with something else than would be taken now. */
export const standingOf = (tx: Tx, clubId: string, scope: TrialScope, madeWith: MadeWith) =>
  countStale(tx, clubId, scope, { engineVersion, madeWith })

/** The trials of those analyses. */
export const trialsMadeOtherwise = (tx: Tx, clubId: string, scope: TrialScope, madeWith: MadeWith) =>
  staleTrials(tx, clubId, scope, { engineVersion, madeWith })

/**
 * Analyses trials again with these settings, plates and place, and stores nothing. A trial that stands so already is
 * left out; one whose analysis ends badly is named in `failed`.
 */
export async function remake(
  deps: JobDeps,
  ctx: ClubContext,
  trialIds: readonly string[],
  madeWith: MadeWith,
): Promise<{ remade: Remade[]; failed: string[] }> {
  const { read, earlier } = await deps.db.inClub(ctx, async (tx) => ({
    read: await trialsToRemake(tx, ctx.clubId, trialIds),
    earlier: await analysesByEngine(tx, ctx.clubId, trialIds, engineVersion),
  }))
  const work = read.map((trial) => toWork(trial, earlier, madeWith)).filter((one) => !one.stands)
  const fresh = work.filter(({ found }) => !found)
  const answers = await analyseEach(deps, fresh.map(taskOf))
  const said = new Map(fresh.map(({ trial }, i) => [trial.trialId, answers[i]]))
  return {
    remade: work.flatMap((one) => toRemade(one, said.get(one.trial.trialId) ?? null)),
    failed: fresh.filter((_, i) => answers[i] === null).map(({ trial }) => trial.trialId),
  }
}

interface Work {
  trial: TrialToRemake
  inputs: AnalysisInputs
  inputsHash: Buffer
  /** The current analysis is this very one. */
  stands: boolean
  /** The same was made before. */
  found: EarlierAnalysis | undefined
}

function toWork(trial: TrialToRemake, earlier: EarlierAnalysis[], madeWith: MadeWith): Work {
  const inputs = remadeWith(trial.inputs, trial.channels, madeWith)
  const inputsHash = hashInputs(inputs, trial.samples)
  const found = earlier.find(
    (analysis) => analysis.trialId === trial.trialId && analysis.inputsHash.equals(inputsHash),
  )
  return { trial, inputs, inputsHash, stands: found?.id === trial.currentId, found }
}

const taskOf = ({ trial, inputs }: Work): AnalyseSamples => ({
  samples: trial.samples,
  options: engineOptions(inputs),
  settings: settingsOf(inputs),
})

/** All at once; where that ends badly one by one, so that one bad recording spoils no other. */
async function analyseEach(
  { threads, log }: JobDeps,
  tasks: AnalyseSamples[],
): Promise<(EngineSaid | null)[]> {
  if (tasks.length === 0) return []
  try {
    return (await threads.analyseAll(tasks)).map(ofOneTrial)
  } catch (error) {
    log.warn({ err: error }, 'a batch could not be analysed at once')
  }
  const answers: (EngineSaid | null)[] = []
  for (const task of tasks) {
    answers.push(await threads.analyseSamples(task).then(ofOneTrial, () => null))
  }
  return answers
}

function toRemade({ trial, inputs, inputsHash, found }: Work, said: EngineSaid | null): Remade[] {
  const { trialId, sessionId, athleteId, published, currentId } = trial
  const of = { trialId, sessionId, athleteId, published, currentId, before: figuresOf(trial.figures) }
  if (found) return [{ ...of, after: figuresOf(found.figures), made: { earlierId: found.id } }]
  return said ? [{ ...of, after: said, made: { inputs, inputsHash, said } }] : []
}

/**
 * Stores what was made again in the place of the current analyses, which are superseded and stay, and rebuilds the
 * sheets. A trial that was analysed by somebody else meanwhile keeps that. Answers with those that were stored.
 */
export async function keepRemade(tx: Tx, ctx: ClubContext, remade: readonly Remade[]): Promise<Remade[]> {
  const { clubId } = ctx
  if (remade.length === 0) return []
  const current = await lockTrials(
    tx,
    clubId,
    remade.map(({ trialId }) => trialId),
  )
  const kept = remade.filter(({ currentId }) => current.has(currentId))
  if (kept.length === 0) return []
  await supersedeAll(
    tx,
    clubId,
    kept.map(({ trialId }) => trialId),
  )
  const earlierIds = kept.flatMap(({ made }) => ('earlierId' in made ? [made.earlierId] : []))
  if (earlierIds.length > 0) await restoreAll(tx, clubId, earlierIds)
  const rows = kept.flatMap(({ trialId, made }) =>
    'said' in made
      ? [
          {
            clubId,
            trialId,
            engineVersion,
            inputsHash: made.inputsHash,
            inputs: made.inputs,
            ...toRow(made.said),
          },
        ]
      : [],
  )
  if (rows.length > 0) await insertAnalyses(tx, rows)
  await rebuildWorkingOf(tx, ctx, kept)
  return kept
}
