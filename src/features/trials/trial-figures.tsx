import type { ReactNode } from 'react'
import type { Analysis } from '../../../shared/contracts/trials.ts'
import { ContactsSheet } from './contacts-sheet.tsx'
import { ImpulseLedger } from './impulse-ledger.tsx'
import { MeasuredSheet } from './measured-sheet.tsx'
import { SidesSheet } from './sides-sheet.tsx'
import { TrialChecks } from './trial-checks.tsx'

interface Props {
  /** The sheet with the trace, beside which ledger and checks stand. */
  trace: ReactNode
  analysis: Analysis | null
  /** While events are being moved: the saved analysis, shown wherever it reads differently. */
  saved?: Analysis | undefined
}

/** All that was measured of a trial, and what stands behind it. */
export function TrialFigures({ trace, analysis, saved }: Props) {
  return (
    <>
      <div className="grid items-start gap-6 lg:grid-cols-[minmax(0,1fr)_22.5rem]">
        {trace}
        {analysis && (
          <div className="flex flex-col gap-5">
            {analysis.ledger && <ImpulseLedger ledger={analysis.ledger} saved={saved?.ledger} />}
            <TrialChecks checks={analysis.checks} notes={analysis.notes} saved={saved?.checks} />
          </div>
        )}
      </div>
      {analysis && (
        <div className="flex flex-col gap-6 pt-6">
          {analysis.contacts && analysis.contacts.length > 0 && (
            <ContactsSheet contacts={analysis.contacts} checks={analysis.checks} saved={saved?.contacts} />
          )}
          <MeasuredSheet analysis={analysis} saved={saved} />
          {analysis.sides && (
            <SidesSheet sides={analysis.sides} checks={analysis.checks} saved={saved?.sides} />
          )}
          <p className="text-small text-ink-2">
            {saved ? 'Provisional, computed on this device' : 'Computed'} by engine {analysis.engineVersion}.
          </p>
        </div>
      )}
    </>
  )
}
