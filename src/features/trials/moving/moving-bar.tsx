import { useState } from 'react'
import { eventWords } from '../../../../shared/contracts/event-words.ts'
import { eventOrder } from '../../../../shared/mechanics/events/event-order.ts'
import { catalogue, type MetricKey } from '../../../../shared/mechanics/catalogue.ts'
import type { Trial } from '../../../../shared/contracts/trials.ts'
import { Button } from '../../../components/button.tsx'
import { FigureText } from '../../results/figure-text.tsx'
import { figureWords } from '../../results/metric-words.ts'
import type { Analysis } from '../engine/analysis-of.ts'
import { changeLines, SaveMovesDialog } from './save-moves-dialog.tsx'
import type { Draft } from './use-draft.ts'

/** What a coach watches while an event is moved; every other figure follows in its own place. */
const watched: readonly MetricKey[] = [
  'jumpHeightImpulse',
  'takeoffVelocity',
  'timeToTakeoff',
  'flightTime',
  'landingPeakForce',
]

interface Props {
  trial: Trial
  draft: Draft
  onEnd: () => void
}

/** What is moved and what that does to the figures; save, put back, leave. */
export function MovingBar({ trial, draft, onEnd }: Props) {
  const [saving, setSaving] = useState(false)
  const { changed, live } = draft
  const dirty = changed.length > 0
  return (
    <div className="mb-3 flex flex-col gap-2 border-s-4 border-ink bg-ground px-3 py-2">
      <p className="text-small text-ink-2">
        Take hold of an event on the trace: Left and Right move it by one sample, with Shift by ten, Home puts
        it back to automatic, Escape undoes. The figures on this page are provisional until they are saved.
      </p>
      {dirty ? <ChangedEvents draft={draft} /> : <p>Nothing is moved yet.</p>}
      {live.failed !== null && (
        <p role="alert" className="text-stop">
          The figures could not be computed here: {live.failed}
        </p>
      )}
      {live.analysis === null ? (
        <p role="alert" className="text-stop">
          With the events there the engine finds no jump.
        </p>
      ) : (
        <WatchedFigures now={live.analysis} saved={trial.analysis} />
      )}
      <div className="flex flex-wrap gap-3">
        <Button look="main" disabled={!dirty || live.analysis === null} onClick={() => setSaving(true)}>
          Save
        </Button>
        {Object.keys(draft.draft).length > 0 && (
          <Button onClick={draft.putAllBack}>All back to automatic</Button>
        )}
        <Button onClick={onEnd}>{dirty ? 'Leave as saved' : 'Done'}</Button>
      </div>
      {saving && (
        <SaveMovesDialog trial={trial} draft={draft} onClose={() => setSaving(false)} onSaved={onEnd} />
      )}
    </div>
  )
}

function ChangedEvents({ draft }: { draft: Draft }) {
  const lines = changeLines(draft)
  const names = eventOrder.filter((name) => draft.changed.includes(name))
  return (
    <ul aria-label="Moved events">
      {names.map((name, i) => (
        <li key={name}>
          {lines[i]}{' '}
          {draft.draft[name] !== undefined && (
            <Button look="word" onClick={() => draft.putBack(name)}>
              Automatic <span className="sr-only">{eventWords[name]}</span>
            </Button>
          )}
        </li>
      ))}
    </ul>
  )
}

/** The figures that a coach watches, and what they were. */
function WatchedFigures({ now, saved }: { now: Analysis; saved: Analysis | null }) {
  const keys = watched.filter((key) => now.metrics[key])
  return (
    <dl aria-live="polite" aria-label="Provisional figures" className="flex flex-wrap gap-x-6 gap-y-1">
      {keys.map((key) => {
        const before = saved?.metrics[key]
        const was = before ? figureWords(key, before) : 'missing'
        const changed = was !== figureWords(key, now.metrics[key]!)
        return (
          <div key={key}>
            <dt className="text-small text-ink-2">{catalogue[key].name}</dt>
            <dd data-metric={key}>
              <FigureText metricKey={key} figure={now.metrics[key]!} unit strong={changed} />
              {changed && <span className="text-small text-ink-2 italic"> was {was}</span>}
            </dd>
          </div>
        )
      })}
    </dl>
  )
}
