import { Link } from 'react-router-dom'
import type { Trial } from '../../../shared/contracts/trials.ts'
import { protocolNames } from '../../../shared/contracts/tests.ts'
import { PageHead } from '../../components/page-head.tsx'
import { formatUncertainty, formatValue } from '../../lib/format-figure.ts'
import { formatDate } from '../../lib/format-date.ts'
import { pathOf } from '../../lib/paths.ts'
import { catalogue } from '../../../shared/mechanics/catalogue.ts'
import { sideWords, testParticulars } from '../../lib/test-words.ts'
import { figureWords, metricInSentence, noFigureWords } from '../results/metric-words.ts'
import { headlineMetric } from '../results/test-metrics.ts'
import { TrialActs } from './trial-acts.tsx'

const velocity = catalogue.takeoffVelocity

interface Props {
  trial: Trial
  /** Begins moving events; null where that cannot be. */
  onMove: (() => void) | null
}

/** Who, when, which file; then the result. */
export function TrialHead({ trial, onMove }: Props) {
  const { title, aside } = resultWords(trial)
  return (
    <PageHead
      title={title}
      aside={aside}
      context={<TrialContext trial={trial} />}
      actions={<TrialActs trial={trial} onMove={onMove} />}
    />
  )
}

function TrialContext({ trial }: { trial: Trial }) {
  const { athlete, placeInSession, fileName } = trial
  const particulars = testParticulars(trial.test)
  return (
    <>
      {athlete ? (
        <Link to={pathOf.athlete(athlete.id)}>{athlete.name}</Link>
      ) : (
        'In the Tray, on no athlete yet'
      )}{' '}
      · <Link to={pathOf.session(trial.sessionId)}>{trial.sessionTitle}</Link>,{' '}
      {formatDate(trial.sessionDate)}
      {trial.place !== null && `, ${trial.place}`}
      {particulars !== '' && ` · ${particulars}`}
      {placeInSession && ` · trial ${placeInSession.n} of ${placeInSession.of}`}
      {fileName !== null && <span className="break-all"> · {fileName}</span>}
    </>
  )
}

/**
 * "Countermovement jump, 35.2 cm" or "Drop jump, RSI 1.85 m/s" and, behind it, how sure that is. A figure that is
 * withheld makes no title.
 */
function resultWords({ analysis, test }: Trial): { title: string; aside?: string } {
  const { protocol, side } = test
  const name = [protocolNames[protocol], ...(side === 'both' ? [] : [sideWords[side]])].join(', ')
  if (!analysis) return { title: `${name}, being analysed` }
  const metric = headlineMetric(protocol)
  const figure = analysis.metrics[metric]
  if (!figure) return { title: `${name}, ${noFigureWords(metric)}` }
  const isHeight = metric === 'jumpHeightImpulse'
  const called = isHeight ? 'height' : metricInSentence(metric)
  if (analysis.withheld.includes(metric)) return { title: `${name}, ${called} withheld by a failed check` }
  const { display } = catalogue[metric]
  const left = analysis.metrics[velocity.key]
  const sure = [
    formatUncertainty(figure.U, display),
    isHeight && left && !analysis.withheld.includes(velocity.key)
      ? `takeoff at ${figureWords(velocity.key, left)}`
      : null,
  ]
  const words = [isHeight ? '' : called, formatValue(figure.value, display), display.unit]
  return { title: `${name}, ${words.filter(Boolean).join(' ')}`, aside: sure.filter(Boolean).join(', ') }
}
