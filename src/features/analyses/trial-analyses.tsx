import { useState } from 'react'
import { type AnalysisEdition, listAnalyses } from '../../../shared/contracts/analyses.ts'
import { catalogue, isMetricKey } from '../../../shared/mechanics/catalogue.ts'
import { useMe, useRoles } from '../../api/account/get-me.ts'
import { useAnalyses } from '../../api/analyses/list-analyses.ts'
import { ScrollRegion } from '../../components/scroll-region.tsx'
import { QueryState } from '../../components/query-state.tsx'
import { Sheet } from '../../components/sheet.tsx'
import { Table, type Column } from '../../components/table.tsx'
import { counted } from '../../lib/counted.ts'
import { formatMoment } from '../../lib/format-date.ts'
import { formatNumber, formatUncertainty, formatValue } from '../../lib/format-figure.ts'
import { mayCall } from '../../lib/may-call.ts'

const headline = ['jumpHeightImpulse', 'takeoffVelocity', 'contactTime', 'landingPeakForcePerBodyWeight']

/**
 * Every analysis of a trial: the one in force and those it took the place of, read when they are opened. Nothing for
 * whoever may not read them.
 */
export function TrialAnalyses({ trialId }: { trialId: string }) {
  const mayRead = mayCall(listAnalyses, useRoles())
  const [open, setOpen] = useState(false)
  if (!mayRead) return null
  return (
    <details className="no-print pt-4" onToggle={(event) => setOpen(event.currentTarget.open)}>
      <summary className="cursor-pointer">Analyses of this trial, older ones too</summary>
      {open && <Analyses trialId={trialId} />}
    </details>
  )
}

function Analyses({ trialId }: { trialId: string }) {
  const analyses = useAnalyses(trialId)
  const timeZone = useMe().data?.club.timeZone ?? 'UTC'
  return (
    <Sheet title="Analyses" titleAside="newest first; old ones are kept" flush>
      <QueryState query={analyses} what="the analyses">
        {({ analyses: list }) => (
          <ScrollRegion label="Analyses of this trial">
            <Table
              caption="Analyses of this trial"
              columns={columnsFor(list, timeZone)}
              rows={list}
              rowKey={({ id }) => id}
            />
          </ScrollRegion>
        )}
      </QueryState>
    </Sheet>
  )
}

function columnsFor(list: AnalysisEdition[], timeZone: string): Column<AnalysisEdition>[] {
  const current = list.find((analysis) => analysis.current) ?? list[0]
  const shown = headline.filter((key) => list.some(({ figures }) => figures[key]))
  return [
    { key: 'made', head: 'Made', cell: ({ madeAt }) => formatMoment(madeAt, timeZone) },
    { key: 'state', head: 'State', cell: stateWords },
    { key: 'engine', head: 'Engine', cell: ({ engineVersion }) => engineVersion },
    { key: 'with', head: 'Made with', cell: (analysis) => madeWithWords(analysis, current) },
    ...shown.map(figureColumn),
    {
      key: 'fails',
      head: 'Checks',
      cell: ({ fails }) => (fails === 0 ? 'none failed' : `${counted(fails, 'fail')}`),
    },
  ]
}

function figureColumn(key: string): Column<AnalysisEdition> {
  if (!isMetricKey(key)) return { key, head: key, cell: () => null }
  const { name, display } = catalogue[key]
  return {
    key,
    head: `${name}${display.unit && `, ${display.unit}`}`,
    figure: true,
    emptyFor: ({ figures }) => !figures[key],
    cell: ({ figures }) => {
      const figure = figures[key]
      if (!figure) return '–'
      return `${formatValue(figure.value, display)} ${formatUncertainty(figure.U, display) ?? ''}`.trimEnd()
    },
  }
}

function stateWords({ current, published }: AnalysisEdition): string {
  if (current) return published ? 'in force, published' : 'in force'
  return published ? 'the athlete reads it' : 'superseded'
}

/** What it was made with that is not the engine's default, and what of it is not as in the one in force. */
function madeWithWords(analysis: AnalysisEdition, current: AnalysisEdition | undefined): string {
  const { changedSettings, gravity, calibrationU, recordedMassKg, movedEvents } = analysis
  const words = Object.entries(changedSettings).map(([key, value]) => `${key} ${value}`)
  if (words.length === 0) words.push('default settings')
  if (movedEvents.length > 0) words.push(`moved: ${movedEvents.join(', ')}`)
  if (current && gravity !== current.gravity) words.push(`g ${formatNumber(gravity, 5)} m/s²`)
  if (current && JSON.stringify(calibrationU) !== JSON.stringify(current.calibrationU))
    words.push(
      `plates ${Object.entries(calibrationU)
        .map(([channel, U]) => `${channel} ${Number((U * 100).toPrecision(6))} %`)
        .join(', ')}`,
    )
  if (current && recordedMassKg !== current.recordedMassKg)
    words.push(
      recordedMassKg === null ? 'no recorded mass' : `recorded mass ${formatNumber(recordedMassKg, 1)} kg`,
    )
  return words.join(' · ')
}
