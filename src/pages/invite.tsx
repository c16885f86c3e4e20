import { useQueryClient } from '@tanstack/react-query'
import { useNavigate, useParams } from 'react-router-dom'
import { startAs } from '../api/account/get-me.ts'
import { useInvitation } from '../api/account/get-invitation.ts'
import { PageHead } from '../components/page-head.tsx'
import { QueryState } from '../components/query-state.tsx'
import { Sheet } from '../components/sheet.tsx'
import { InvitationForm } from '../features/account/invitation-form.tsx'
import { paths } from '../lib/paths.ts'
import { roleNames } from '../lib/role-names.ts'

export function InvitePage() {
  const { token = '' } = useParams()
  const invitation = useInvitation(token)
  const queryClient = useQueryClient()
  const navigate = useNavigate()

  return (
    <>
      <PageHead title={invitation.data ? `Join ${invitation.data.clubName}` : 'Invitation'} />
      <Sheet>
        <QueryState query={invitation} what="the invitation">
          {(view) => (
            <div className="flex flex-col gap-4 py-1">
              <p>
                {view.clubName} invites you as{' '}
                {view.roles.map((role) => roleNames[role].toLowerCase()).join(' and ')}.
              </p>
              <InvitationForm
                token={token}
                invitation={view}
                onAccepted={(me) => {
                  startAs(queryClient, me)
                  void navigate(paths.home, { replace: true })
                }}
              />
            </div>
          )}
        </QueryState>
      </Sheet>
    </>
  )
}
