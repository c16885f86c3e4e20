import { useState } from 'react'
import { useParams } from 'react-router-dom'
import { changeAthlete, type Athlete } from '../../shared/contracts/athletes.ts'
import type { Squad } from '../../shared/contracts/squads.ts'
import { useRoles } from '../api/account/get-me.ts'
import { useAthlete } from '../api/athletes/get-athlete.ts'
import { useSquads } from '../api/squads/list-squads.ts'
import { Button } from '../components/button.tsx'
import { PageHead } from '../components/page-head.tsx'
import { QueryState } from '../components/query-state.tsx'
import { Tag } from '../components/tag.tsx'
import { AthleteResults } from '../features/athletes/athlete-results.tsx'
import { ChangeAthleteDialog } from '../features/athletes/change-athlete-dialog.tsx'
import { squadNamesOf } from '../features/athletes/squad-names.ts'
import { RecomputeEntry } from '../features/recomputes/recompute-entry.tsx'
import { formatDate } from '../lib/format-date.ts'
import { formatNumber } from '../lib/format-figure.ts'
import { mayCall } from '../lib/may-call.ts'

export function AthletePage() {
  const { athleteId = '' } = useParams()
  const profile = useAthlete(athleteId)
  const squads = useSquads()
  return (
    <>
      {profile.isError && !profile.data && <PageHead title="Athlete" />}
      <QueryState query={profile} what="the athlete">
        {({ athlete, results }) => (
          <>
            <AthleteHead athlete={athlete} squads={squads.data} />
            <AthleteResults results={results} />
          </>
        )}
      </QueryState>
    </>
  )
}

function AthleteHead({ athlete, squads }: { athlete: Athlete; squads: Squad[] | undefined }) {
  const mayChange = mayCall(changeAthlete, useRoles())
  const [changing, setChanging] = useState(false)
  return (
    <>
      <PageHead
        context={contextOf(athlete, squads ?? [])}
        title={athlete.name}
        aside={athlete.archived && <Tag>archived</Tag>}
        actions={
          <>
            {mayChange && squads && <Button onClick={() => setChanging(true)}>Change</Button>}
            <RecomputeEntry scope={{ kind: 'athlete', athleteId: athlete.id }} of={athlete.name} />
          </>
        }
      />
      {changing && squads && (
        <ChangeAthleteDialog
          athlete={athlete}
          squads={squads.filter((squad) => !squad.archived)}
          onClose={() => setChanging(false)}
        />
      )}
    </>
  )
}

function contextOf(athlete: Athlete, squads: Squad[]): string {
  const { bornOn, recordedMassKg } = athlete
  return [
    squadNamesOf(athlete, squads).join(', ') || 'In no squad',
    bornOn === null ? '' : `born ${formatDate(bornOn)}`,
    recordedMassKg === null ? '' : `${formatNumber(recordedMassKg, 1)} kg recorded`,
  ]
    .filter(Boolean)
    .join(' · ')
}
