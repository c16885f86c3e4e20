import type { ReactNode } from 'react'
import type { z } from 'zod'
import type { HighLanding, listHighLandings } from '../../../shared/contracts/landing-watch.ts'
import { Protocol, protocolNames } from '../../../shared/contracts/tests.ts'
import { ButtonLink } from '../../components/button.tsx'
import { CautionLine } from '../../components/caution-line.tsx'
import { EmptyState } from '../../components/empty-state.tsx'
import { Sheet } from '../../components/sheet.tsx'
import { Table } from '../../components/table.tsx'
import { counted } from '../../lib/counted.ts'
import { formatNumber } from '../../lib/format-figure.ts'
import { paths } from '../../lib/paths.ts'
import { landingColumns } from './landing-columns.tsx'

type Watch = z.infer<typeof listHighLandings.response>

/** The landings above the club's limits, heaviest first; those that a failed check leaves in doubt stand apart. */
export function HighLandings({ watch, days }: { watch: Watch; days: number }) {
  const limits = limitWords(watch.limits)
  if (limits === null) {
    return (
      <Sheet flush>
        <EmptyState title="No limit is set" action={<ButtonLink to={paths.settings}>Set a limit</ButtonLink>}>
          A landing is listed here once its peak is above the limit that the club sets for its test. No
          validated limit exists; the club’s own is a matter for licensed practice.
        </EmptyState>
      </Sheet>
    )
  }
  const verified = watch.landings.filter((landing) => !landing.unverified)
  const unverified = watch.landings.filter((landing) => landing.unverified)
  return (
    <div className="flex flex-col gap-5">
      <p className="text-ink-2">The club’s limits: {limits}.</p>
      <Landings title="Above the limit" landings={verified}>
        <EmptyState title={`No landing of the last ${days} days is above the club’s limits`}>
          A landing is looked at as soon as its recording is analysed, published or not.
        </EmptyState>
      </Landings>
      {unverified.length > 0 && (
        <Landings
          title="Unverified"
          aside="a check of the landing failed: no flag, look at the trial first"
          landings={unverified}
        />
      )}
      <CautionLine />
    </div>
  )
}

interface LandingsProps {
  title: string
  aside?: string
  landings: HighLanding[]
  /** Stands where there are none. */
  children?: ReactNode
}

function Landings({ title, aside, landings, children }: LandingsProps) {
  return (
    <Sheet title={title} titleAside={aside ?? counted(landings.length, 'landing')} flush>
      {landings.length === 0 ? (
        children
      ) : (
        <Table
          caption={`${title}, heaviest first`}
          columns={landingColumns}
          rows={landings}
          rowKey={(landing) => landing.trialId}
        />
      )}
    </Sheet>
  )
}

/** "Countermovement jump 4.25 BW"; null where none is set. */
function limitWords(limits: Watch['limits']): string | null {
  const words = Protocol.options.flatMap((protocol) => {
    const limit = limits[protocol]
    return limit === undefined ? [] : [`${protocolNames[protocol]} ${formatNumber(limit, 2)} BW`]
  })
  return words.join(', ') || null
}
