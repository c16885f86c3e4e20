import { workerContext } from '../../db/database.ts'
import { defineJob } from '../../jobs/define-job.ts'
import { analyseTrial, giveUpAnalysing } from './analyses.service.ts'

export const analyseTrialJob = defineJob('analyse-trial', (deps, { clubId, trialId }) =>
  analyseTrial(deps, workerContext(clubId), trialId),
)

/** Every try ended badly: the trial says so, instead of waiting for ever. */
export const giveUpAnalysingJob = defineJob('give-up-analysing', (deps, { clubId, trialId }) =>
  giveUpAnalysing(deps, workerContext(clubId), trialId),
)
