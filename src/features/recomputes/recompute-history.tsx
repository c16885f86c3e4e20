import { useState } from 'react'
import type { Recompute, RecomputeState, Scope } from '../../../shared/contracts/recomputes.ts'
import { useMe } from '../../api/account/get-me.ts'
import { useRecompute } from '../../api/recomputes/get-recompute.ts'
import { useRecomputes } from '../../api/recomputes/list-recomputes.ts'
import { Button } from '../../components/button.tsx'
import { QueryState } from '../../components/query-state.tsx'
import { counted } from '../../lib/counted.ts'
import { formatMoment } from '../../lib/format-date.ts'
import { RecomputeReportView } from './recompute-report.tsx'

const shownAtFirst = 5

/** Those that have ended, newest first, the newest with its report open. */
export function RecomputeHistory({ scope }: { scope: Scope }) {
  const list = useRecomputes(scope)
  const [opened, setOpened] = useState<string | null>(null)
  const [all, setAll] = useState(false)
  return (
    <QueryState query={list} what="the earlier recomputes">
      {({ recomputes }) => {
        const ended = recomputes.filter(({ state }) => state !== 'waiting' && state !== 'running')
        if (ended.length === 0) return null
        const open = opened ?? ended[0]?.id
        return (
          <div>
            <h3 className="pb-1 font-semibold">Earlier recomputes</h3>
            <ul className="border-t border-rule">
              {(all ? ended : ended.slice(0, shownAtFirst)).map((one) => (
                <HistoryLine
                  key={one.id}
                  recompute={one}
                  isOpen={one.id === open}
                  onToggle={() => setOpened(one.id === open ? '' : one.id)}
                />
              ))}
            </ul>
            {ended.length > shownAtFirst && (
              <Button look="word" onClick={() => setAll(!all)}>
                {all ? 'Show the newest only' : `Show all ${ended.length}`}
              </Button>
            )}
          </div>
        )
      }}
    </QueryState>
  )
}

interface LineProps {
  recompute: Recompute
  isOpen: boolean
  onToggle: () => void
}

function HistoryLine({ recompute, isOpen, onToggle }: LineProps) {
  const timeZone = useMe().data?.club.timeZone ?? 'UTC'
  const { dryRun, scopeName, requestedByName, requestedAt } = recompute
  return (
    <li className="border-b border-rule py-1">
      <div className="flex flex-wrap items-baseline justify-between gap-x-4">
        <span>
          {formatMoment(requestedAt, timeZone)}: {dryRun ? 'dry run' : 'recompute'} of{' '}
          {scopeName ?? 'the whole club'} by {requestedByName}, {stateWords(recompute)}
        </span>
        <Button look="word" aria-expanded={isOpen} onClick={onToggle}>
          {isOpen ? 'Hide what moved' : 'Show what moved'}
        </Button>
      </div>
      {isOpen && <Report recompute={recompute} />}
    </li>
  )
}

function Report({ recompute }: { recompute: Recompute }) {
  const found = useRecompute(recompute.id)
  return (
    <div className="py-3">
      <QueryState query={found} what="the report">
        {({ report }) =>
          report === null ? (
            <p>Nothing was compared yet.</p>
          ) : (
            <RecomputeReportView recompute={recompute} report={report} />
          )
        }
      </QueryState>
    </div>
  )
}

function stateWords({ state, done, total }: Recompute): string {
  const words: Record<RecomputeState, string> = {
    waiting: 'waiting',
    running: 'running',
    done: counted(total, 'trial'),
    cancelled: `cancelled after ${done} of ${counted(total, 'trial')}`,
    failed: `ended by a fault after ${done} of ${counted(total, 'trial')}; start it again`,
  }
  return words[state]
}
