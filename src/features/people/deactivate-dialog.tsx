import type { Person } from '../../../shared/contracts/people.ts'
import { useMe } from '../../api/account/get-me.ts'
import { useChangePerson } from '../../api/people/change-person.ts'
import { useDeactivateMyself } from '../../api/people/deactivate-myself.ts'
import { useAnnounce } from '../../components/announcer.tsx'
import { ConfirmDialog } from '../../components/confirm-dialog.tsx'

interface Props {
  person: Person
  onClose: () => void
}

/** Deactivates a person, or lets them in again. */
export function DeactivateDialog({ person, onClose }: Props) {
  const isOneself = useMe().data?.person.id === person.id
  return isOneself && person.active ? (
    <LeaveDialog person={person} onClose={onClose} />
  ) : (
    <OtherDialog person={person} onClose={onClose} />
  )
}

function OtherDialog({ person, onClose }: Props) {
  const change = useChangePerson()
  const announce = useAnnounce()
  const active = !person.active
  const confirm = () =>
    change.mutate(
      { params: { personId: person.id }, body: { version: person.version, active } },
      {
        onSuccess: () => {
          announce({
            text: `${person.name} ${active ? 'may sign in again' : 'can no longer sign in to this club'}.`,
          })
          onClose()
        },
      },
    )
  return (
    <ConfirmDialog
      title={active ? `Let ${person.name} in again?` : `Deactivate ${person.name}?`}
      act={active ? 'Let them in again' : 'Deactivate'}
      onConfirm={confirm}
      onClose={onClose}
      busy={change.isPending}
      error={change.error}
    >
      {active
        ? `${person.name} can sign in to this club again, with the roles they had.`
        : `${person.name} is signed out everywhere and can no longer sign in to this club. Nothing they did is removed, and you can let them in again.`}
    </ConfirmDialog>
  )
}

/** To oneself it is said as what it is: afterwards nobody but another admin can undo it. */
function LeaveDialog({ person, onClose }: Props) {
  const leave = useDeactivateMyself()
  return (
    <ConfirmDialog
      title="Deactivate yourself?"
      act="Deactivate myself"
      onConfirm={() =>
        leave.mutate({ params: { personId: person.id }, body: { version: person.version, active: false } })
      }
      onClose={onClose}
      busy={leave.isPending}
      error={leave.error}
    >
      You are signed out everywhere at once and can no longer sign in to this club. Nothing you did is
      removed; only another admin can let you in again.
    </ConfirmDialog>
  )
}
