import { getSessionArchive, getTrialCsv } from '../../../shared/contracts/downloads.ts'
import { addressOf } from '../client.ts'

/** Where the browser downloads a trial's cleaned samples from, as CSV. */
export function trialCsvAddress(trialId: string): string {
  return addressOf(getTrialCsv, { params: { trialId } })
}

/** Where the browser downloads a session from: originals, cleaned samples and figures in one zip archive. */
export function sessionArchiveAddress(sessionId: string): string {
  return addressOf(getSessionArchive, { params: { sessionId } })
}
