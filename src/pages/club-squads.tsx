import { useState } from 'react'
import { useAthletes } from '../api/athletes/list-athletes.ts'
import { useSquads } from '../api/squads/list-squads.ts'
import { Button } from '../components/button.tsx'
import { EmptyState } from '../components/empty-state.tsx'
import { PageHead } from '../components/page-head.tsx'
import { QueryState } from '../components/query-state.tsx'
import { Sheet } from '../components/sheet.tsx'
import { AddSquadDialog } from '../features/squads/add-squad-dialog.tsx'
import { SquadList } from '../features/squads/squad-list.tsx'

export function ClubSquadsPage() {
  const squads = useSquads()
  const athletes = useAthletes()
  const [adding, setAdding] = useState(false)
  return (
    <>
      <PageHead
        title="Squads"
        actions={
          <Button look="main" onClick={() => setAdding(true)}>
            Add a squad
          </Button>
        }
      />
      <QueryState query={squads} what="the squads">
        {(all) => (
          <QueryState query={athletes} what="the athletes">
            {(everybody) => (
              <>
                {all.length === 0 ? (
                  <Sheet flush>
                    <EmptyState title="No squads yet">
                      Add the first one. A session is made for squads: their athletes stand on its sheet.
                    </EmptyState>
                  </Sheet>
                ) : (
                  <SquadList squads={all} athletes={everybody} />
                )}
                {adding && <AddSquadDialog athletes={everybody} onClose={() => setAdding(false)} />}
              </>
            )}
          </QueryState>
        )}
      </QueryState>
    </>
  )
}
