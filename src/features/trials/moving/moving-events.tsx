import { useState } from 'react'
import type { EngineInputs } from '../../../../shared/contracts/moved-events.ts'
import type { Trial } from '../../../../shared/contracts/trials.ts'
import { useSamples } from '../../../api/trials/get-samples.ts'
import type { Samples } from '../../../api/trials/read-samples.ts'
import { LeaveGuard } from '../../../components/leave-guard.tsx'
import { QueryState } from '../../../components/query-state.tsx'
import { Sheet } from '../../../components/sheet.tsx'
import { TrialFigures } from '../trial-figures.tsx'
import { MovingBar } from './moving-bar.tsx'
import { MovingTrace } from './moving-trace.tsx'
import { useDraft } from './use-draft.ts'

interface Props {
  trial: Trial
  onEnd: () => void
}

/** A trial whose events are being moved: every figure follows, computed by the same engine on this device. */
export function MovingEvents({ trial, onEnd }: Props) {
  // Whatever others do meanwhile, the save is over the trial as it stood when the moving began.
  const [opened] = useState(trial)
  const samples = useSamples(opened)
  return (
    <QueryState query={samples} what="the recording">
      {(channels) =>
        opened.engineInputs && (
          <Moving trial={opened} samples={channels} inputs={opened.engineInputs} onEnd={onEnd} />
        )
      }
    </QueryState>
  )
}

function Moving({ trial, samples, inputs, onEnd }: Props & { samples: Samples; inputs: EngineInputs }) {
  const draft = useDraft(trial, samples, inputs)
  const { live, changed } = draft
  return (
    <>
      <LeaveGuard dirty={changed.length > 0} what="What you moved on this page" />
      <TrialFigures
        analysis={live.analysis}
        saved={trial.analysis ?? undefined}
        trace={
          <Sheet title="Force and momentum" className="min-w-0">
            <MovingBar trial={trial} draft={draft} onEnd={onEnd} />
            <MovingTrace trial={trial} samples={samples} draft={draft} />
          </Sheet>
        }
      />
    </>
  )
}
