import { Link } from 'react-router-dom'
import type { HighLanding } from '../../../shared/contracts/landing-watch.ts'
import { catalogue } from '../../../shared/mechanics/catalogue.ts'
import type { Column } from '../../components/table.tsx'
import { formatDateShort } from '../../lib/format-date.ts'
import { formatValue } from '../../lib/format-figure.ts'
import { pathOf } from '../../lib/paths.ts'
import { testWords } from '../../lib/test-words.ts'
import { FigureText } from '../results/figure-text.tsx'

const peakKey = 'landingPeakForcePerBodyWeight'
const { display } = catalogue[peakKey]

export const landingColumns: Column<HighLanding>[] = [
  {
    key: 'athlete',
    head: 'Athlete',
    cell: (landing) => <Link to={pathOf.athlete(landing.athlete.id)}>{landing.athlete.name}</Link>,
  },
  {
    key: 'peak',
    head: `Peak, ${display.unit}`,
    cell: (landing) => (
      <FigureText metricKey={peakKey} figure={{ value: landing.peak, U: landing.U }} strong />
    ),
    figure: true,
  },
  {
    key: 'limit',
    head: `Limit, ${display.unit}`,
    cell: (landing) => formatValue(landing.limit, display),
    figure: true,
  },
  { key: 'test', head: 'Test', cell: (landing) => testWords(landing.test) },
  { key: 'date', head: 'Date', cell: (landing) => formatDateShort(landing.date) },
  {
    key: 'session',
    head: 'Session',
    cell: (landing) => <Link to={pathOf.session(landing.sessionId)}>{landing.sessionTitle}</Link>,
  },
  {
    key: 'trial',
    head: '',
    label: 'Trial',
    cell: (landing) => (
      <Link to={pathOf.trial(landing.trialId)}>
        Open the trial{' '}
        <span className="sr-only">
          of {landing.athlete.name}, {formatDateShort(landing.date)}
        </span>
      </Link>
    ),
  },
]
