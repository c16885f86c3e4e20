import { useState } from 'react'
import { createAthlete } from '../../shared/contracts/athletes.ts'
import { useRoles } from '../api/account/get-me.ts'
import { useAthletes } from '../api/athletes/list-athletes.ts'
import { useSquads } from '../api/squads/list-squads.ts'
import { Button } from '../components/button.tsx'
import { EmptyState } from '../components/empty-state.tsx'
import { PageHead } from '../components/page-head.tsx'
import { QueryState } from '../components/query-state.tsx'
import { Sheet } from '../components/sheet.tsx'
import { AddAthleteDialog } from '../features/athletes/add-athlete-dialog.tsx'
import { Roster } from '../features/athletes/roster.tsx'
import { mayCall } from '../lib/may-call.ts'

export function AthletesPage() {
  const athletes = useAthletes()
  const squads = useSquads()
  const mayAdd = mayCall(createAthlete, useRoles())
  const [adding, setAdding] = useState(false)
  const add = mayAdd && (
    <Button look="main" onClick={() => setAdding(true)}>
      Add an athlete
    </Button>
  )

  return (
    <>
      <PageHead title="Athletes" actions={add || undefined} />
      <QueryState query={athletes} what="the athletes">
        {(all) => (
          <QueryState query={squads} what="the squads">
            {(allSquads) => (
              <>
                {all.length === 0 ? (
                  <Sheet flush>
                    <EmptyState title="No athletes yet">
                      {mayAdd
                        ? 'Add the first one: a name is enough. A session needs a squad, and a squad needs athletes.'
                        : 'A coach or a club admin adds them.'}
                    </EmptyState>
                  </Sheet>
                ) : (
                  <Roster athletes={all} squads={allSquads} />
                )}
                {adding && (
                  <AddAthleteDialog
                    squads={allSquads.filter((squad) => !squad.archived)}
                    onClose={() => setAdding(false)}
                  />
                )}
              </>
            )}
          </QueryState>
        )}
      </QueryState>
    </>
  )
}
