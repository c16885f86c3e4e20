import { Link } from 'react-router-dom'
import type { Trial } from '../../../../shared/contracts/trials.ts'
import { useAthlete } from '../../../api/athletes/get-athlete.ts'
import type { OverlaidTrial } from '../../../api/trials/get-overlaid.ts'
import { mostOverlays, overlayDash } from '../../../charts/trial-trace/overlay-dash.ts'
import { Button } from '../../../components/button.tsx'
import { SelectField } from '../../../components/field.tsx'
import { QueryState } from '../../../components/query-state.tsx'
import { Table, type Column } from '../../../components/table.tsx'
import { formatDateShort } from '../../../lib/format-date.ts'
import { pathOf } from '../../../lib/paths.ts'
import { catalogue, type MetricKey } from '../../../../shared/mechanics/catalogue.ts'
import { FigureText } from '../../results/figure-text.tsx'
import { metricHead } from '../../results/metric-words.ts'
import { overlayChoices } from './overlay-choices.ts'
import { overlayLetter, type AlignAt } from './overlay-of.ts'
import type { Overlay } from './use-overlay.ts'

/** What trials laid over one another are compared by. */
const compared: readonly MetricKey[] = [
  'jumpHeightImpulse',
  'takeoffVelocity',
  'timeToTakeoff',
  'peakForce',
  'landingPeakForcePerBodyWeight',
]

interface Props {
  trial: Trial
  athleteId: string
  overlay: Overlay
}

/** Chooses what is laid over the trace and where it is aligned; says which line is which, with their figures. */
export function OverlayPanel({ trial, athleteId, overlay }: Props) {
  const athlete = useAthlete(athleteId)
  return (
    <div className="flex flex-col gap-3 border-t border-rule pt-3">
      <div className="no-print flex flex-wrap items-end gap-x-6 gap-y-3">
        <QueryState query={athlete} what="the athlete’s other trials">
          {({ results }) => (
            <Choice trial={trial} choices={overlayChoices(trial, results)} overlay={overlay} />
          )}
        </QueryState>
        <AlignChoice alignAt={overlay.alignAt} onChange={overlay.alignTo} />
      </div>
      {overlay.failed && (
        <p role="alert">One of the trials could not be fetched. Take it off and lay it over again.</p>
      )}
      {overlay.unaligned.length > 0 && (
        <p role="status">
          {overlay.unaligned.join(' and ')} cannot be drawn: no {overlay.alignAt} was found in it.
        </p>
      )}
      {overlay.laid.length > 0 && <Figures trial={trial} overlay={overlay} />}
    </div>
  )
}

interface ChoiceProps {
  trial: Trial
  choices: ReturnType<typeof overlayChoices>
  overlay: Overlay
}

function Choice({ choices, overlay }: ChoiceProps) {
  const open = choices.filter(({ trialId }) => !overlay.trialIds.includes(trialId))
  if (choices.length === 0)
    return <p className="text-small">This athlete has no other trial of this test that counts.</p>
  return (
    <SelectField
      label="Lay over another trial"
      hint={`Of this athlete, the same test. At most ${mostOverlays}.`}
      className="max-w-full"
      value=""
      disabled={overlay.trialIds.length >= mostOverlays}
      onChange={(event) => overlay.lay(event.target.value)}
    >
      <option value="">Choose a trial</option>
      {open.map(({ trialId, words }) => (
        <option key={trialId} value={trialId}>
          {words}
        </option>
      ))}
    </SelectField>
  )
}

function AlignChoice({ alignAt, onChange }: { alignAt: AlignAt; onChange: (at: AlignAt) => void }) {
  return (
    <div role="group" aria-label="Aligned at" className="flex gap-2">
      {(['takeoff', 'onset'] as const).map((at) => (
        <Button key={at} aria-pressed={alignAt === at} onClick={() => onChange(at)}>
          {alignAt === at ? `Aligned at ${at}` : `Align at ${at}`}
        </Button>
      ))}
    </div>
  )
}

interface Line {
  /** null for the trial whose page this is. */
  letter: string | null
  dash: string | undefined
  trial: OverlaidTrial['trial']
}

function Figures({ trial, overlay }: { trial: Trial; overlay: Overlay }) {
  const lines: Line[] = [
    { letter: null, dash: undefined, trial },
    ...overlay.laid.map(({ trial: other }, i) => ({
      letter: overlayLetter(i),
      dash: overlayDash(i),
      trial: other,
    })),
  ]
  const columns: Column<Line>[] = [
    { key: 'line', head: 'Line', cell: (line) => <LineName line={line} /> },
    ...compared.map((key) => ({
      key,
      head: metricHead(key),
      label: catalogue[key].name,
      figure: true,
      cell: (line: Line) => <LineFigure line={line} metricKey={key} />,
    })),
    {
      key: 'off',
      head: '',
      label: 'Acts',
      cell: ({ letter, trial: { id } }) =>
        letter !== null && (
          <Button look="word" onClick={() => overlay.takeOff(id)}>
            Take off <span className="sr-only">{letter}</span>
          </Button>
        ),
    },
  ]
  return (
    <Table
      caption="The trials laid over one another"
      columns={columns}
      rows={lines}
      rowKey={({ trial: { id } }) => id}
    />
  )
}

function LineName({ line: { letter, dash, trial } }: { line: Line }) {
  const words = `${formatDateShort(trial.sessionDate)}, ${trial.sessionTitle}`
  return (
    <span className="flex flex-wrap items-center gap-x-2">
      <svg
        width="36"
        height="8"
        aria-hidden="true"
        className={letter === null ? 'stroke-ink' : 'stroke-ink-2'}
      >
        <line x1="0" x2="36" y1="4" y2="4" strokeWidth={letter === null ? 2 : 1.6} strokeDasharray={dash} />
      </svg>
      {letter === null ? (
        'This trial'
      ) : (
        <>
          {letter}:{' '}
          <Link to={pathOf.trial(trial.id)}>
            {words}
            {trial.placeInSession && `, jump ${trial.placeInSession.n}`}
          </Link>
        </>
      )}
    </span>
  )
}

function LineFigure({ line: { trial }, metricKey }: { line: Line; metricKey: MetricKey }) {
  const figure = trial.analysis?.metrics[metricKey]
  if (!figure) return '–'
  if (trial.analysis?.withheld.includes(metricKey)) return 'withheld'
  return <FigureText metricKey={metricKey} figure={figure} />
}
