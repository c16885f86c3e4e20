import { Link } from 'react-router-dom'
import type { Analysis, Trial } from '../../../shared/contracts/trials.ts'
import { catalogue, type MetricKey } from '../../../shared/mechanics/catalogue.ts'
import type { Protocol } from '../../../shared/mechanics/types.ts'
import { CautionLine } from '../../components/caution-line.tsx'
import { MethodLink } from '../../components/method-link.tsx'
import { PageHead } from '../../components/page-head.tsx'
import { Sheet } from '../../components/sheet.tsx'
import { formatDate } from '../../lib/format-date.ts'
import { paths } from '../../lib/paths.ts'
import { testWords, trialNouns } from '../../lib/test-words.ts'
import { FigureText } from '../results/figure-text.tsx'
import { BigFigure } from '../results/big-figure.tsx'
import { metricInSentence } from '../results/metric-words.ts'
import { headlineMetric } from '../results/test-metrics.ts'
import { TraceSheet } from './trace-sheet.tsx'

/** Told of a landing alone; after a jump they are figures too many. */
const toldOfLandings: readonly MetricKey[] = ['landingTime', 'timeToStabilisation']
/** What an athlete reads of their own trial, in this order; a test has those that belong to it. */
const told: readonly MetricKey[] = [
  'rsi',
  'rsiBestFive',
  'hopCount',
  'contactTime',
  'contactTimeMean',
  'jumpHeightImpulse',
  'takeoffVelocity',
  'timeToTakeoff',
  'flightTime',
  'countermovementDepth',
  'effectiveDropHeight',
  'landingPeakForcePerBodyWeight',
  ...toldOfLandings,
]

/** An athlete's own published trial: the result, the trace, what the figures mean. */
export function OwnTrialView({ trial }: { trial: Trial }) {
  const { analysis, placeInSession, test } = trial
  const headline = headlineMetric(test.protocol)
  const figure = analysis?.metrics[headline]
  const stands = figure && !analysis.withheld.includes(headline)
  const noun = trialNouns[test.protocol]
  return (
    <>
      <PageHead
        title={`Your ${noun}${placeInSession ? ` ${placeInSession.n} of ${placeInSession.of}` : ''}`}
        context={
          <>
            <Link to={paths.me}>My results</Link> · {trial.sessionTitle}, {formatDate(trial.sessionDate)} ·{' '}
            {testWords(test)}
          </>
        }
      />
      <div className="flex flex-col gap-5">
        {stands ? (
          <BigFigure metricKey={headline} figure={figure} />
        ) : (
          <p>
            This {noun}’s {headline === 'jumpHeightImpulse' ? 'height' : metricInSentence(headline)} was not
            sure enough to be shown.
          </p>
        )}
        <TraceSheet trial={trial} />
        {analysis && <WhatItMeans analysis={analysis} protocol={test.protocol} />}
      </div>
    </>
  )
}

function WhatItMeans({ analysis, protocol }: { analysis: Analysis; protocol: Protocol }) {
  const noun = trialNouns[protocol]
  const headline = headlineMetric(protocol)
  const inOrder = [headline, ...told.filter((key) => key !== headline)]
  const keys = inOrder.filter(
    (key) =>
      analysis.metrics[key] &&
      !analysis.withheld.includes(key) &&
      (protocol === 'dropLanding' || !toldOfLandings.includes(key)),
  )
  if (keys.length === 0)
    return (
      <Sheet title="What was measured">
        <p className="py-2">No figure of this {noun} was sure enough to be shown. Your coach sees why.</p>
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
        The figure after ± says how sure the plate is of this one {noun}. It says nothing of how much you
        differ from day to day.
      </p>
      <CautionLine />
    </Sheet>
  )
}
