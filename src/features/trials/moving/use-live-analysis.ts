import { useEffect, useRef, useState } from 'react'
import type { EngineInputs } from '../../../../shared/contracts/moved-events.ts'
import type { Trial } from '../../../../shared/contracts/trials.ts'
import type { MovedEvents } from '../../../../shared/mechanics/events/event-order.ts'
import type { Samples } from '../../../api/trials/read-samples.ts'
import type { Analysis } from '../engine/analysis-of.ts'
import { latestOnly } from '../engine/latest-only.ts'
import { openEngine } from '../engine/open-engine.ts'

interface Live {
  /** The newest answer; null where the engine finds no jump with the events there. */
  analysis: Analysis | null
  /** The moved events that it is an answer to; null before the first. */
  of: MovedEvents | null
  failed: string | null
}

/** What the engine of this page says of the trial with these events moved, as they are being moved. */
export function useLiveAnalysis(
  recording: Trial['recording'],
  samples: Samples,
  inputs: EngineInputs,
  movedEvents: MovedEvents,
  atFirst: Analysis | null,
): Live {
  const [live, setLive] = useState<Live>({ analysis: atFirst, of: null, failed: null })
  const ask = useRef<(movedEvents: MovedEvents) => void>(() => undefined)
  // What the worker holds is what it was given when the moving began: a trial that is read again changes nothing.
  const [held] = useState(() => ({ recording: recordingOf(recording, samples), inputs }))

  useEffect(() => {
    const engine = openEngine()
    const fail = (error: unknown) => {
      if (!open) return
      setLive((before) => ({ ...before, failed: error instanceof Error ? error.message : String(error) }))
    }
    let open = true
    engine.ask('hold', held).catch(fail)
    ask.current = latestOnly((moved: MovedEvents) => engine.ask('analyse', { movedEvents: moved }), {
      onAnswer: (analysis, of) => setLive({ analysis, of, failed: null }),
      onFailure: fail,
    })
    return () => {
      open = false
      ask.current = () => undefined
      engine.close()
    }
  }, [held])

  useEffect(() => ask.current(movedEvents), [movedEvents, held])

  return live
}

function recordingOf({ sampleRateHz, filledSamples, timeBaseError }: Trial['recording'], samples: Samples) {
  return { sampleRateHz, channels: samples, filledSamples, timeBaseError, notes: [] }
}
