import { useQueryClient } from '@tanstack/react-query'
import { useEffect, useRef, useState } from 'react'
import { startRecompute, type Scope } from '../../../shared/contracts/recomputes.ts'
import { useRoles } from '../../api/account/get-me.ts'
import { useStanding, type Standing } from '../../api/recomputes/get-standing.ts'
import { useStartRecompute } from '../../api/recomputes/start-recompute.ts'
import { useAnnounce } from '../../components/announcer.tsx'
import { Button } from '../../components/button.tsx'
import { FormError } from '../../components/form-error.tsx'
import { Notice } from '../../components/notice.tsx'
import { QueryState } from '../../components/query-state.tsx'
import { counted } from '../../lib/counted.ts'
import { mayCall } from '../../lib/may-call.ts'
import { RecomputeHistory } from './recompute-history.tsx'
import { RecomputeProgress } from './recompute-progress.tsx'
import { staleSentence } from './standing-words.ts'

/** What is to be recomputed in a scope, the acts, how far they are, and what came of the earlier ones. */
export function RecomputePanel({ scope }: { scope: Scope }) {
  const standing = useStanding(scope)
  const mayStart = mayCall(startRecompute, useRoles())
  useRefreshAtEnd(standing.data?.open?.id)
  return (
    <QueryState query={standing} what="the analyses">
      {(now) => (
        <div className="flex flex-col gap-5">
          {now.open ? (
            <RecomputeProgress recompute={now.open} mayCancel={mayStart} />
          ) : (
            <Acts scope={scope} standing={now} mayStart={mayStart} />
          )}
          <RecomputeHistory scope={scope} />
        </div>
      )}
    </QueryState>
  )
}

/** Figures everywhere may be others when a recompute has ended. */
function useRefreshAtEnd(openId: string | undefined) {
  const queryClient = useQueryClient()
  const announce = useAnnounce()
  const earlier = useRef(openId)
  useEffect(() => {
    if (earlier.current !== undefined && openId === undefined) {
      announce({ text: 'It has ended. What came of it stands under “Earlier recomputes”.' })
      void queryClient.invalidateQueries()
    }
    earlier.current = openId
  }, [openId, queryClient, announce])
}

function Acts({ scope, standing, mayStart }: { scope: Scope; standing: Standing; mayStart: boolean }) {
  const start = useStartRecompute()
  const [asking, setAsking] = useState(false)
  if (standing.stale === 0)
    return (
      <p>
        {standing.total === 0
          ? 'There is no analysis yet.'
          : `All ${standing.total} analyses were made with what holds now, and engine ${standing.engineVersion}.`}
      </p>
    )
  const begin = (dryRun: boolean) =>
    start.mutate({ body: { scope, dryRun } }, { onSettled: () => setAsking(false) })
  return (
    <div className="flex max-w-prose flex-col gap-3">
      <Notice tone="caution">
        <p>{staleSentence(standing)}</p>
      </Notice>
      <p>
        A dry run analyses them with what holds now, stores nothing, and says which figures would move and by
        how much. A recompute puts the new analyses in force; the old ones are kept.
      </p>
      <FormError error={start.error} />
      {mayStart && !asking && (
        <div className="flex flex-wrap gap-3">
          <Button look="main" busy={start.isPending} onClick={() => begin(true)}>
            Dry run
          </Button>
          <Button onClick={() => setAsking(true)}>Recompute</Button>
        </div>
      )}
      {asking && (
        <Notice tone="plain" role="alert" title={`Recompute ${counted(standing.stale, 'trial')}?`}>
          <p>
            Sheets, profiles and the Landing watch show the new figures from then on. Athletes go on reading
            what was published until you publish again. Setting everything back and recomputing brings the old
            analyses back.
          </p>
          <div className="flex flex-wrap gap-3 pt-1">
            <Button look="main" busy={start.isPending} onClick={() => begin(false)}>
              Recompute now
            </Button>
            <Button onClick={() => setAsking(false)}>Leave it as it is</Button>
          </div>
        </Notice>
      )}
    </div>
  )
}
