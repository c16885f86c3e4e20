import { useState } from 'react'
import { useMe } from '../api/account/get-me.ts'
import { useAthletes } from '../api/athletes/list-athletes.ts'
import { usePeople } from '../api/people/list-people.ts'
import { Button } from '../components/button.tsx'
import { PageHead } from '../components/page-head.tsx'
import { QueryState } from '../components/query-state.tsx'
import { InvitationList } from '../features/people/invitation-list.tsx'
import { InviteDialog } from '../features/people/invite-dialog.tsx'
import { PeopleList } from '../features/people/people-list.tsx'

export function ClubPeoplePage() {
  const people = usePeople()
  const athletes = useAthletes()
  const timeZone = useMe().data?.club.timeZone ?? 'UTC'
  const [inviting, setInviting] = useState(false)
  return (
    <>
      <PageHead
        title="People"
        actions={
          <Button look="main" onClick={() => setInviting(true)}>
            Invite somebody
          </Button>
        }
      />
      <QueryState query={people} what="the people">
        {(all) => (
          <div className="flex flex-col gap-6">
            <InvitationList invitations={all.invitations} timeZone={timeZone} />
            <div>
              <PeopleList people={all.people} />
            </div>
          </div>
        )}
      </QueryState>
      {inviting && <InviteDialog athletes={athletes.data ?? []} onClose={() => setInviting(false)} />}
    </>
  )
}
