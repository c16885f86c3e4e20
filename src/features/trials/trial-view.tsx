import type { Trial } from '../../../shared/contracts/trials.ts'
import { Notice } from '../../components/notice.tsx'
import { ImpulseLedger } from './impulse-ledger.tsx'
import { MeasuredSheet } from './measured-sheet.tsx'
import { SidesSheet } from './sides-sheet.tsx'
import { TraceSheet } from './trace-sheet.tsx'
import { TrialChecks } from './trial-checks.tsx'
import { TrialHead } from './trial-head.tsx'

/** A trial for whoever runs sessions: all that was measured, and what stands behind it. */
export function TrialView({ trial }: { trial: Trial }) {
  const { analysis, setAside } = trial
  return (
    <>
      <TrialHead trial={trial} />
      {setAside && (
        <div className="pb-4">
          <Notice tone="caution" title={`Set aside by ${setAside.byName}: ${setAside.reason}`}>
            <p>It is kept with its reason and stays out of means, trends and what athletes see.</p>
          </Notice>
        </div>
      )}
      <div className="grid items-start gap-6 lg:grid-cols-[minmax(0,1fr)_22.5rem]">
        <TraceSheet trial={trial} />
        {analysis && (
          <div className="flex flex-col gap-5">
            {analysis.ledger && <ImpulseLedger ledger={analysis.ledger} />}
            <TrialChecks checks={analysis.checks} notes={analysis.notes} />
          </div>
        )}
      </div>
      {analysis && (
        <div className="flex flex-col gap-6 pt-6">
          <MeasuredSheet analysis={analysis} />
          {analysis.sides && <SidesSheet sides={analysis.sides} checks={analysis.checks} />}
          <p className="text-small text-ink-2">Computed by engine {analysis.engineVersion}.</p>
        </div>
      )}
    </>
  )
}
