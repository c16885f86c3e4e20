import { Link } from 'react-router-dom'
import type { Trial } from '../../../shared/contracts/trials.ts'
import { protocolNames } from '../../../shared/contracts/tests.ts'
import { PageHead } from '../../components/page-head.tsx'
import { formatUncertainty, formatValue } from '../../lib/format-figure.ts'
import { formatDate } from '../../lib/format-date.ts'
import { pathOf } from '../../lib/paths.ts'
import { catalogue } from '../../../shared/mechanics/catalogue.ts'
import { figureWords } from '../results/metric-words.ts'
import { TrialActs } from './trial-acts.tsx'

const height = catalogue.jumpHeightImpulse
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
      {placeInSession && ` · trial ${placeInSession.n} of ${placeInSession.of}`}
      {fileName !== null && <span className="break-all"> · {fileName}</span>}
    </>
  )
}

/** "Countermovement jump, 35.2 cm" and, behind it, how sure that is. A withheld height makes no title. */
function resultWords({ analysis, test }: Trial): { title: string; aside?: string } {
  const name = protocolNames[test.protocol]
  if (!analysis) return { title: `${name}, being analysed` }
  const jumped = analysis.metrics[height.key]
  if (!jumped) return { title: `${name}, no jump height` }
  if (analysis.withheld.includes(height.key)) return { title: `${name}, height withheld by a failed check` }
  const left = analysis.metrics[velocity.key]
  const sure = [
    formatUncertainty(jumped.U, height.display),
    left && !analysis.withheld.includes(velocity.key)
      ? `takeoff at ${figureWords(velocity.key, left)}`
      : null,
  ]
  return {
    title: `${name}, ${formatValue(jumped.value, height.display)} ${height.display.unit}`,
    aside: sure.filter(Boolean).join(', '),
  }
}
