import { useNavigate } from 'react-router-dom'
import { usualTest } from '../../shared/contracts/session-test.ts'
import { useMe } from '../api/account/get-me.ts'
import { useCreateSession } from '../api/sessions/create-session.ts'
import { useSquads } from '../api/squads/list-squads.ts'
import { PageHead } from '../components/page-head.tsx'
import { QueryState } from '../components/query-state.tsx'
import { Sheet } from '../components/sheet.tsx'
import { SessionForm } from '../features/sessions/session-form.tsx'
import { todayIn } from '../lib/format-date.ts'
import { pathOf } from '../lib/paths.ts'

export function NewSessionPage() {
  const squads = useSquads()
  const timeZone = useMe().data?.club.timeZone ?? 'UTC'
  const navigate = useNavigate()
  const create = useCreateSession((session) => void navigate(pathOf.session(session.id)))
  return (
    <>
      <PageHead title="New session" />
      <Sheet>
        <QueryState query={squads} what="the squads">
          {(all) => (
            <SessionForm
              values={{
                title: '',
                date: todayIn(timeZone, new Date()),
                place: null,
                note: null,
                test: usualTest('cmj'),
                squadIds: [],
              }}
              squads={all.filter((squad) => !squad.archived)}
              onSave={async (body) => void (await create.mutateAsync({ body }))}
            />
          )}
        </QueryState>
      </Sheet>
    </>
  )
}
