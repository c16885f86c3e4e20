import { useState } from 'react'
import type { Invitation } from '../../../shared/contracts/people.ts'
import { useResendInvitation } from '../../api/people/resend-invitation.ts'
import { useAnnounce } from '../../components/announcer.tsx'
import { Sheet } from '../../components/sheet.tsx'
import { Table } from '../../components/table.tsx'
import { counted } from '../../lib/counted.ts'
import { wordingOf } from '../../lib/error-wording.ts'
import { invitationColumns } from './invitation-columns.tsx'
import { WithdrawDialog } from './withdraw-dialog.tsx'

/** Open invitations, those about to run out first. */
export function InvitationList({ invitations, timeZone }: { invitations: Invitation[]; timeZone: string }) {
  const resend = useResendInvitation()
  const announce = useAnnounce()
  const [withdrawing, setWithdrawing] = useState<Invitation | null>(null)
  const columns = invitationColumns({
    timeZone,
    onResend: ({ id, version, email }) =>
      resend.mutate(
        { params: { invitationId: id }, body: { version } },
        {
          onSuccess: () =>
            announce({ text: `A new link is on its way to ${email}; the old one no longer works.` }),
          onError: (error) => {
            const { title, advice } = wordingOf(error)
            announce({ text: `Nothing was sent to ${email}. ${title}. ${advice}` })
          },
        },
      ),
    onWithdraw: setWithdrawing,
  })
  if (invitations.length === 0) return null
  const byExpiry = [...invitations].sort((a, b) => a.expiresAt.localeCompare(b.expiresAt))
  return (
    <Sheet title="Open invitations" titleAside={counted(invitations.length, 'invitation')} flush>
      <Table caption="Open invitations" columns={columns} rows={byExpiry} rowKey={({ id }) => id} />
      {withdrawing && <WithdrawDialog invitation={withdrawing} onClose={() => setWithdrawing(null)} />}
    </Sheet>
  )
}
