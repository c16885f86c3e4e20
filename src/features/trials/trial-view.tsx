import { lazy, Suspense, useState } from 'react'
import type { Trial } from '../../../shared/contracts/trials.ts'
import { Loading } from '../../components/loading.tsx'
import { Notice } from '../../components/notice.tsx'
import { TrialAnalyses } from '../analyses/trial-analyses.tsx'
import { AdjustedNotice } from './adjusted-notice.tsx'
import { TraceSheet } from './trace-sheet.tsx'
import { TrialFigures } from './trial-figures.tsx'
import { TrialHead } from './trial-head.tsx'

/** Fetched when somebody first moves an event: it brings the engine. */
const MovingEvents = lazy(async () => ({
  default: (await import('./moving/moving-events.tsx')).MovingEvents,
}))

/** A trial for whoever runs sessions: all that was measured, and what stands behind it. */
export function TrialView({ trial }: { trial: Trial }) {
  const [moving, setMoving] = useState(false)
  const { analysis, setAside, engineInputs } = trial
  const mayMove = engineInputs !== null && analysis !== null
  return (
    <>
      <TrialHead trial={trial} onMove={mayMove && !moving ? () => setMoving(true) : null} />
      {setAside && (
        <div className="pb-4">
          <Notice tone="caution" title={`Set aside by ${setAside.byName}: ${setAside.reason}`}>
            <p>It is kept with its reason and stays out of means, trends and what athletes see.</p>
          </Notice>
        </div>
      )}
      <AdjustedNotice trial={trial} mayPutBack={mayMove && !moving} />
      {moving ? (
        <Suspense fallback={<Loading what="the engine" />}>
          <MovingEvents trial={trial} onEnd={() => setMoving(false)} />
        </Suspense>
      ) : (
        <TrialFigures analysis={analysis} trace={<TraceSheet trial={trial} />} />
      )}
      <TrialAnalyses trialId={trial.id} />
    </>
  )
}
