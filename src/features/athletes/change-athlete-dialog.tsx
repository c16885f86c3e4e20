import { Athlete } from '../../../shared/contracts/athletes.ts'
import type { Squad } from '../../../shared/contracts/squads.ts'
import { useChangeAthlete } from '../../api/athletes/change-athlete.ts'
import { ChangeRowDialog } from '../../components/change-row-dialog.tsx'
import { AthleteForm, type AthleteValues } from './athlete-form.tsx'
import { athleteStaleFields } from './athlete-stale-fields.ts'

interface ChangeAthleteDialogProps {
  athlete: Athlete
  squads: Squad[]
  onClose: () => void
}

export function ChangeAthleteDialog({ athlete, squads, onClose }: ChangeAthleteDialogProps) {
  const change = useChangeAthlete()
  return (
    <ChangeRowDialog
      row={athlete}
      schema={Athlete}
      valuesOf={valuesOf}
      staleFields={athleteStaleFields(squads)}
      save={(athleteId, body) => change.mutateAsync({ params: { athleteId }, body })}
      busy={change.isPending}
      onClose={onClose}
    >
      {(form) => <AthleteForm {...form} squads={squads} act="Save" />}
    </ChangeRowDialog>
  )
}

function valuesOf({ name, bornOn, recordedMassKg, squadIds }: Athlete): AthleteValues {
  return { name, bornOn, recordedMassKg, squadIds }
}
