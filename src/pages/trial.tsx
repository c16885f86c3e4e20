import { useParams } from 'react-router-dom'
import { useClubEvents } from '../api/events/use-club-events.ts'
import { useTrial } from '../api/trials/get-trial.ts'
import { QueryState } from '../components/query-state.tsx'
import { OwnTrialView } from '../features/trials/own-trial-view.tsx'
import { TrialView } from '../features/trials/trial-view.tsx'

export function TrialPage() {
  const { trialId = '' } = useParams()
  const trial = useTrial(trialId)
  useClubEvents()
  return (
    <QueryState query={trial} what="the trial">
      {(found) =>
        found.mayEdit ? <TrialView key={found.id} trial={found} /> : <OwnTrialView trial={found} />
      }
    </QueryState>
  )
}
