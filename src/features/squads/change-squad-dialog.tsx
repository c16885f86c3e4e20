import type { Athlete } from '../../../shared/contracts/athletes.ts'
import { Squad } from '../../../shared/contracts/squads.ts'
import { useChangeSquad } from '../../api/squads/change-squad.ts'
import { ChangeRowDialog } from '../../components/change-row-dialog.tsx'
import type { StaleField } from '../../components/stale-notice.tsx'
import { SquadForm, type SquadValues } from './squad-form.tsx'

interface ChangeSquadDialogProps {
  squad: Squad
  athletes: Athlete[]
  onClose: () => void
}

export function ChangeSquadDialog({ squad, athletes, onClose }: ChangeSquadDialogProps) {
  const change = useChangeSquad()
  return (
    <ChangeRowDialog
      row={squad}
      schema={Squad}
      valuesOf={valuesOf}
      staleFields={staleFields(athletes)}
      save={(squadId, body) => change.mutateAsync({ params: { squadId }, body })}
      busy={change.isPending}
      onClose={onClose}
    >
      {(form) => <SquadForm {...form} athletes={athletes} act="Save" />}
    </ChangeRowDialog>
  )
}

function valuesOf({ name, athleteIds }: Squad): SquadValues {
  return { name, athleteIds }
}

function staleFields(athletes: Athlete[]): StaleField<Squad>[] {
  const namesOf = (ids: string[]) => athletes.filter(({ id }) => ids.includes(id)).map(({ name }) => name)
  return [
    { label: 'Name', show: ({ name }) => name },
    { label: 'Members', show: ({ athleteIds }) => namesOf(athleteIds).join(', ') || 'none' },
    { label: 'Archived', show: ({ archived }) => (archived ? 'yes' : 'no') },
  ]
}
