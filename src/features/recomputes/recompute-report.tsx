import { useState } from 'react'
import { Link } from 'react-router-dom'
import type { FigureMove, Recompute, RecomputeReport } from '../../../shared/contracts/recomputes.ts'
import { getTrial } from '../../../shared/contracts/trials.ts'
import { useRoles } from '../../api/account/get-me.ts'
import { Button } from '../../components/button.tsx'
import { ScrollRegion } from '../../components/scroll-region.tsx'
import { Table } from '../../components/table.tsx'
import { counted } from '../../lib/counted.ts'
import { formatDateShort } from '../../lib/format-date.ts'
import { mayCall } from '../../lib/may-call.ts'
import { pathOf } from '../../lib/paths.ts'
import { figureColumns, moverColumns } from './report-columns.tsx'

const shownAtFirst = 10

interface Props {
  recompute: Recompute
  report: RecomputeReport
}

/** What moved, or would: per figure, per verdict, in which published sessions, and in which trials most. */
export function RecomputeReportView({ recompute, report }: Props) {
  const mayOpen = mayCall(getTrial, useRoles())
  const moved = report.figures
    .filter((figure) => figure.moved + figure.uMoved + figure.appeared + figure.vanished > 0)
    .sort(byGreatest)
  return (
    <div className="flex flex-col gap-4">
      <Summary recompute={recompute} report={report} />
      {moved.length > 0 && <FiguresTable figures={moved} />}
      <PublishedSessions sessions={report.publishedSessions} mayOpen={mayOpen} />
      {report.greatest.length > 0 && (
        <div>
          <h3 className="pb-1 font-semibold">Greatest changes, one a trial</h3>
          <ScrollRegion label="Greatest changes">
            <Table
              caption="Greatest changes, one a trial"
              columns={moverColumns(mayOpen)}
              rows={report.greatest}
              rowKey={({ trialId }) => trialId}
            />
          </ScrollRegion>
        </div>
      )}
    </div>
  )
}

/** Those first that moved by the most of their give or take; what only got another give or take after them. */
const byGreatest = (a: FigureMove, b: FigureMove) =>
  (b.greatestMultiple ?? -1) - (a.greatestMultiple ?? -1) || b.moved - a.moved || b.uMoved - a.uMoved

function Summary({ recompute: { dryRun }, report }: Props) {
  const { trials, trialsMoved, trialsFailed, checks } = report
  const would = dryRun ? 'would move' : 'moved'
  const verdicts = checks.toFail + checks.fromFail + checks.other
  return (
    <div className="max-w-prose">
      <p>
        In {trialsMoved} of {counted(trials, 'trial')} something {would}.{' '}
        {verdicts === 0
          ? `No check ${dryRun ? 'would change' : 'changed'} its verdict.`
          : `${counted(verdicts, 'check')} ${dryRun ? 'would change' : 'changed'} verdict: ${checks.toFail} to a fail, ${checks.fromFail} from a fail, ${checks.other} otherwise.`}
      </p>
      {trialsFailed > 0 && (
        <p>
          {counted(trialsFailed, 'trial')} could not be analysed again and{' '}
          {trialsFailed === 1 ? 'keeps' : 'keep'} the analysis there is.
        </p>
      )}
    </div>
  )
}

function FiguresTable({ figures }: { figures: FigureMove[] }) {
  const [all, setAll] = useState(false)
  return (
    <div>
      <h3 className="pb-1 font-semibold">By figure</h3>
      <ScrollRegion label="Changes by figure">
        <Table
          caption="Changes by figure"
          columns={figureColumns}
          rows={all ? figures : figures.slice(0, shownAtFirst)}
          rowKey={({ metric, of }) => `${metric}/${of}`}
        />
      </ScrollRegion>
      {figures.length > shownAtFirst && (
        <Button look="word" onClick={() => setAll(!all)}>
          {all ? `Show the ${shownAtFirst} that move most` : `Show all ${figures.length} figures`}
        </Button>
      )}
      <p className="max-w-prose pt-1 text-small text-ink-2">
        × give or take: the change in multiples of what comparisons of this figure go by (without plate
        calibration and gravity, which are the same every time). Below 1 a change is inside what one trial can
        tell. Medians are right to 1 %.
      </p>
    </div>
  )
}

function PublishedSessions({
  sessions,
  mayOpen,
}: {
  sessions: RecomputeReport['publishedSessions']
  mayOpen: boolean
}) {
  if (sessions.length === 0) return null
  return (
    <div>
      <h3 className="pb-1 font-semibold">Published sessions</h3>
      <p className="max-w-prose">
        Athletes go on reading what was published until the session is published again.
      </p>
      <ul className="list-disc ps-5">
        {sessions.map(({ id, title, date, trials }) => (
          <li key={id}>
            {mayOpen ? <Link to={pathOf.session(id)}>{title}</Link> : title}, {formatDateShort(date)}:{' '}
            {counted(trials, 'trial')}
          </li>
        ))}
      </ul>
    </div>
  )
}
