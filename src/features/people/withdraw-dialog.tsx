import type { Invitation } from '../../../shared/contracts/people.ts'
import { useWithdrawInvitation } from '../../api/people/withdraw-invitation.ts'
import { useAnnounce } from '../../components/announcer.tsx'
import { ConfirmDialog } from '../../components/confirm-dialog.tsx'

export function WithdrawDialog({ invitation, onClose }: { invitation: Invitation; onClose: () => void }) {
  const withdraw = useWithdrawInvitation()
  const announce = useAnnounce()
  const confirm = () =>
    withdraw.mutate(
      { params: { invitationId: invitation.id }, body: { version: invitation.version } },
      {
        onSuccess: () => {
          announce({ text: `The invitation of ${invitation.name} is withdrawn.` })
          onClose()
        },
      },
    )
  return (
    <ConfirmDialog
      title={`Withdraw the invitation of ${invitation.name}?`}
      act="Withdraw the invitation"
      onConfirm={confirm}
      onClose={onClose}
      busy={withdraw.isPending}
      error={withdraw.error}
    >
      The link in the mail to {invitation.email} stops working. To invite them later you send a new one.
    </ConfirmDialog>
  )
}
