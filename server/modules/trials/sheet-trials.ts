import type { SheetTrial } from '../../../shared/contracts/sessions.ts'
import { sheetMetrics } from '../../../shared/contracts/sheet-metrics.ts'
import { withheldMetrics } from '../../../shared/mechanics/withheld.ts'
import type { SheetTrialRow } from './trials.queries.ts'

/** A row of a session's trials as a cell of the sheet. */
export function toSheetTrial(row: SheetTrialRow): SheetTrial {
  const { id, uploadId, fileName, athleteId, assignedBy, test, preview, version } = row
  const setAside = setAsideOf(row)
  return {
    id,
    uploadId,
    fileName,
    athleteId,
    assignedBy,
    test,
    setAside,
    preview,
    analysis: row.analysis && analysisOf(row.analysis),
    version,
  }
}

export function setAsideOf(row: { setAsideReason: string | null; setAsideByName: string | null }) {
  return row.setAsideReason === null ? null : { reason: row.setAsideReason, byName: row.setAsideByName ?? '' }
}

function analysisOf({
  id,
  metricValues,
  metricUncertainties,
  checks,
}: NonNullable<SheetTrialRow['analysis']>) {
  const metrics = Object.fromEntries(
    sheetMetrics
      .filter((key) => key in metricValues)
      .map((key) => [key, { value: metricValues[key], U: metricUncertainties[key]?.[0] ?? null }]),
  )
  const fails = checks.filter(({ verdict }) => verdict === 'fail')
  const cautions = checks.filter(({ verdict }) => verdict === 'caution')
  return {
    id,
    metrics,
    withheld: withheldMetrics({ metrics, checks }),
    cautions: cautions.length,
    fails: fails.length,
    worstSentence: (fails[0] ?? cautions[0])?.sentence ?? null,
  }
}
