import { Link } from 'react-router-dom'
import type { Analysis, Trial } from '../../../shared/contracts/trials.ts'
import { catalogue, type MetricKey } from '../../../shared/mechanics/catalogue.ts'
import { CautionLine } from '../../components/caution-line.tsx'
import { MethodLink } from '../../components/method-link.tsx'
import { PageHead } from '../../components/page-head.tsx'
import { Sheet } from '../../components/sheet.tsx'
import { formatDate } from '../../lib/format-date.ts'
import { paths } from '../../lib/paths.ts'
import { FigureText } from '../results/figure-text.tsx'
import { BigFigure } from '../results/big-figure.tsx'
import { TraceSheet } from './trace-sheet.tsx'

/** What an athlete reads of their own trial, in this order. */
const told: readonly MetricKey[] = [
  'jumpHeightImpulse',
  'takeoffVelocity',
  'timeToTakeoff',
  'flightTime',
  'countermovementDepth',
  'landingPeakForcePerBodyWeight',
]

/** An athlete's own published trial: the result, the trace, what the figures mean. */
export function OwnTrialView({ trial }: { trial: Trial }) {
  const { analysis, placeInSession } = trial
  const height = analysis?.metrics.jumpHeightImpulse
  const stands = height && !analysis.withheld.includes('jumpHeightImpulse')
  return (
    <>
      <PageHead
        title={placeInSession ? `Your jump ${placeInSession.n} of ${placeInSession.of}` : 'Your jump'}
        context={
          <>
            <Link to={paths.me}>My results</Link> · {trial.sessionTitle}, {formatDate(trial.sessionDate)}
          </>
        }
      />
      <div className="flex flex-col gap-5">
        {stands ? (
          <BigFigure metricKey="jumpHeightImpulse" figure={height} />
        ) : (
          <p>This jump’s height was not sure enough to be shown.</p>
        )}
        <TraceSheet trial={trial} />
        {analysis && <WhatItMeans analysis={analysis} />}
      </div>
    </>
  )
}

function WhatItMeans({ analysis }: { analysis: Analysis }) {
  const keys = told.filter((key) => analysis.metrics[key] && !analysis.withheld.includes(key))
  if (keys.length === 0)
    return (
      <Sheet title="What was measured">
        <p className="py-2">No figure of this jump was sure enough to be shown. Your coach sees why.</p>
      </Sheet>
    )
  return (
    <Sheet title="What was measured">
      <dl>
        {keys.map((key) => (
          <div
            key={key}
            className="grid grid-cols-[1fr_auto] items-baseline gap-x-4 border-b border-rule-2 py-2"
          >
            <dt className="font-semibold">
              <MethodLink noteKey={key}>{catalogue[key].name}</MethodLink>
            </dt>
            <dd>
              <FigureText metricKey={key} figure={analysis.metrics[key]!} unit />
            </dd>
            <dd className="col-span-full text-ink-2">{catalogue[key].athleteSentence}</dd>
          </div>
        ))}
      </dl>
      <p className="py-2 text-small text-ink-2">
        The figure after ± says how sure the plate is of this one jump. It says nothing of how much you differ
        from day to day.
      </p>
      <CautionLine />
    </Sheet>
  )
}
