import { useId, useMemo, useState } from 'react'
import type { Trial } from '../../../../shared/contracts/trials.ts'
import { eventWords } from '../../../../shared/contracts/event-words.ts'
import type { Samples } from '../../../api/trials/read-samples.ts'
import { EventHandles } from '../../../charts/trial-trace/event-handles.tsx'
import { jumpView } from '../../../charts/trial-trace/trace-view.ts'
import { TrialTrace } from '../../../charts/trial-trace/trial-trace.tsx'
import { Button } from '../../../components/button.tsx'
import { traceDataOf } from '../trace-data-of.ts'
import { traceSummary } from '../trace-summary.ts'
import type { Draft } from './use-draft.ts'

/** Half of what is drawn round an event that is looked at closely, seconds. */
const closeS = 0.15

interface Props {
  trial: Trial
  samples: Samples
  draft: Draft
}

/** The trace with its events as handles; the view stands still while an event is moved. */
export function MovingTrace({ trial, samples, draft }: Props) {
  const { live, draft: moved, times, held, acts } = draft
  const shown = useMemo(
    () => ({ ...trial, analysis: live.analysis ?? trial.analysis }),
    [trial, live.analysis],
  )
  const whole = useMemo(() => traceDataOf(shown, samples), [shown, samples])
  const events = useMemo(
    () =>
      // Where the person put them at once; the engine's own follow with its answer.
      whole?.events.map(({ key, label, timeS }) => ({
        key,
        label,
        timeS: moved[key] ?? timeS,
        adjusted: moved[key] !== undefined,
      })),
    [whole, moved],
  )
  const [wide] = useState(() => jumpView(whole?.phases ?? [], whole?.durationS ?? 0))
  const [closeOn, setCloseOn] = useState<number | null>(null)
  const durationS = whole?.durationS ?? 0
  const view = useMemo(
    () =>
      closeOn === null
        ? wide
        : { startS: Math.max(0, closeOn - closeS), endS: Math.min(durationS, closeOn + closeS) },
    [closeOn, durationS, wide],
  )
  const summaryId = useId()
  const helpId = useId()
  if (!whole || !events) return <p>The recording holds no force that could be drawn.</p>
  const heldS = held === null ? undefined : times[held]
  return (
    <div className="flex flex-col gap-2">
      <TrialTrace
        data={whole}
        events={events}
        view={view}
        summaryId={summaryId}
        handles={(frame) => <EventHandles frame={frame} describedBy={helpId} {...acts} />}
      />
      <p id={helpId} className="sr-only">
        Left and Right move by one sample, with Shift by ten. Home: automatic. Escape: undo.
      </p>
      <p id={summaryId} className="max-w-3xl text-small text-ink-2">
        {traceSummary(shown)}
      </p>
      <div className="text-small">
        {closeOn === null ? (
          <Button look="word" disabled={heldS === undefined} onClick={() => setCloseOn(heldS ?? null)}>
            {held === null
              ? 'Look closely at an event: take hold of it first'
              : `Look closely at ${eventWords[held]}`}
          </Button>
        ) : (
          <Button look="word" onClick={() => setCloseOn(null)}>
            Show the jump
          </Button>
        )}
      </div>
    </div>
  )
}
