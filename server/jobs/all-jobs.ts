import { analyseTrialJob, giveUpAnalysingJob } from '../modules/analyses/analyses.jobs.ts'
import { reconcileBillingJob, syncBillingJob } from '../modules/billing/billing.jobs.ts'
import { sendMailJob } from '../modules/mail/mail.jobs.ts'
import {
  addUpMovesJob,
  giveUpRecomputingJob,
  recomputeBatchJob,
} from '../modules/recomputes/recomputes.jobs.ts'
import { giveUpReadingJob, readUploadJob } from '../modules/uploads/uploads.jobs.ts'
import type { Job } from './define-job.ts'

/** Every job: one for each queue of the list. */
export const allJobs: readonly Job[] = [
  readUploadJob,
  analyseTrialJob,
  sendMailJob,
  syncBillingJob,
  reconcileBillingJob,
  giveUpReadingJob,
  giveUpAnalysingJob,
  recomputeBatchJob,
  addUpMovesJob,
  giveUpRecomputingJob,
]
