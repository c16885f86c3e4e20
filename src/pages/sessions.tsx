import { useClubEvents } from '../api/events/use-club-events.ts'
import { ButtonLink } from '../components/button.tsx'
import { PageHead } from '../components/page-head.tsx'
import { SessionList } from '../features/sessions/session-list.tsx'
import { paths } from '../lib/paths.ts'

export function SessionsPage() {
  useClubEvents()
  return (
    <>
      <PageHead
        title="Sessions"
        actions={
          <ButtonLink look="main" to={paths.newSession}>
            New session
          </ButtonLink>
        }
      />
      <SessionList />
    </>
  )
}
