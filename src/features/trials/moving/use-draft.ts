import { useRef, useState } from 'react'
import type { EngineInputs } from '../../../../shared/contracts/moved-events.ts'
import type { Trial } from '../../../../shared/contracts/trials.ts'
import type { MovedEvents } from '../../../../shared/mechanics/events/event-order.ts'
import type { EventName } from '../../../../shared/mechanics/types.ts'
import type { Samples } from '../../../api/trials/read-samples.ts'
import type { HandleActs } from '../../../charts/trial-trace/event-handles.tsx'
import { boundsOf, changedEvents, placeWithin, stepFrom, timesOf, withoutEvent } from './draft-times.ts'
import { useLiveAnalysis } from './use-live-analysis.ts'

/** The events as a person is moving them, what the engine says of that, and what the handles do. */
export function useDraft(trial: Trial, samples: Samples, inputs: EngineInputs) {
  const [saved] = useState<MovedEvents>(() => trial.eventMoves[0]?.events ?? {})
  const [draft, setDraft] = useState(saved)
  const live = useLiveAnalysis(trial.recording, samples, inputs, draft, trial.analysis)
  const [held, setHeld] = useState<EventName | null>(null)
  const before = useRef(draft)

  const { sampleRateHz, sampleCount } = trial.recording
  const clock = { sampleRateHz, endS: (sampleCount - 1) / sampleRateHz }
  const times = timesOf(live.analysis ?? trial.analysis ?? { events: {} }, draft)

  const put = (name: EventName, timeS: number) => {
    const place = placeWithin(name, timeS, times, clock)
    if (place !== null && place !== draft[name]) setDraft({ ...draft, [name]: place })
  }
  const acts: HandleActs = {
    bounds: (name) => boundsOf(name, times, clock),
    onMove: put,
    onStep: (name, steps) => put(name, stepFrom(times[name] ?? 0, steps, clock)),
    onAutomatic: (name) => setDraft(withoutEvent(draft, name)),
    onCancel: (name) => {
      const stood = before.current[name]
      setDraft(stood === undefined ? withoutEvent(draft, name) : { ...draft, [name]: stood })
    },
    onHold: (name) => {
      before.current = draft
      setHeld(name)
    },
  }
  return {
    saved,
    /** Where the events stood when the moving began. */
    stood: timesOf(trial.analysis ?? { events: {} }, {}),
    draft,
    times,
    live,
    held,
    acts,
    changed: changedEvents(draft, saved),
    putBack: (name: EventName) => setDraft(withoutEvent(draft, name)),
    putAllBack: () => setDraft({}),
  }
}
export type Draft = ReturnType<typeof useDraft>
