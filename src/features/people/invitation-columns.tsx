import type { Invitation } from '../../../shared/contracts/people.ts'
import { Button } from '../../components/button.tsx'
import type { Column } from '../../components/table.tsx'
import { Tag } from '../../components/tag.tsx'
import { formatMoment } from '../../lib/format-date.ts'
import { roleNames } from '../../lib/role-names.ts'

interface InvitationActs {
  timeZone: string
  onResend: (invitation: Invitation) => void
  onWithdraw: (invitation: Invitation) => void
}

export function invitationColumns({ timeZone, onResend, onWithdraw }: InvitationActs): Column<Invitation>[] {
  return [
    { key: 'name', head: 'Invited', cell: ({ name }) => name },
    { key: 'email', head: 'E-mail address', cell: ({ email }) => email },
    { key: 'roles', head: 'As', cell: ({ roles }) => roles.map((role) => roleNames[role]).join(', ') },
    {
      key: 'expires',
      head: 'Link works until',
      cell: ({ expiresAt, expired }) => (
        <>
          {formatMoment(expiresAt, timeZone)} {expired && <Tag tone="caution">run out</Tag>}
        </>
      ),
    },
    {
      key: 'acts',
      head: '',
      label: 'Acts',
      cell: (invitation) => (
        <span className="flex gap-4 sm:justify-end">
          <Button
            look="word"
            aria-label={`Send again to ${invitation.name}`}
            onClick={() => onResend(invitation)}
          >
            Send again
          </Button>
          <Button
            look="word"
            aria-label={`Withdraw the invitation of ${invitation.name}`}
            onClick={() => onWithdraw(invitation)}
          >
            Withdraw
          </Button>
        </span>
      ),
    },
  ]
}
