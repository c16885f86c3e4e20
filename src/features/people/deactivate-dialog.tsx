import type { Person } from '../../../shared/contracts/people.ts'
import { useChangePerson } from '../../api/people/change-person.ts'
import { useAnnounce } from '../../components/announcer.tsx'
import { ConfirmDialog } from '../../components/confirm-dialog.tsx'

/** Deactivates a person, or lets them in again. */
export function DeactivateDialog({ person, onClose }: { person: Person; onClose: () => void }) {
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
