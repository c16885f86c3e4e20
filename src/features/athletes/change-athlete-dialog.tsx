import { useState } from 'react'
import { Athlete } from '../../../shared/contracts/athletes.ts'
import type { Squad } from '../../../shared/contracts/squads.ts'
import { useChangeAthlete } from '../../api/athletes/change-athlete.ts'
import { useAnnounce } from '../../components/announcer.tsx'
import { Dialog } from '../../components/dialog.tsx'
import { StaleNotice } from '../../components/stale-notice.tsx'
import { changedValues } from '../../lib/changed-values.ts'
import { useStaleRow } from '../../lib/use-stale-row.ts'
import { AthleteForm, type AthleteValues } from './athlete-form.tsx'
import { athleteStaleFields } from './athlete-stale-fields.ts'

interface ChangeAthleteDialogProps {
  athlete: Athlete
  squads: Squad[]
  onClose: () => void
}

export function ChangeAthleteDialog({ athlete, squads, onClose }: ChangeAthleteDialogProps) {
  const change = useChangeAthlete()
  const announce = useAnnounce()
  const [dirty, setDirty] = useState(false)
  const { opened, newer, version, catchStale, takeTheirs } = useStaleRow(athlete, Athlete)

  const save = async (values: AthleteValues) => {
    const body = { version, ...changedValues(valuesOf(opened), values) }
    try {
      const saved = await change.mutateAsync({ params: { athleteId: opened.id }, body })
      announce({ text: `${saved.name} is saved.` })
      onClose()
    } catch (error) {
      catchStale(error)
    }
  }

  return (
    <Dialog title={`Change ${opened.name}`} onClose={onClose} dirty={dirty}>
      <AthleteForm
        key={opened.version}
        values={valuesOf(opened)}
        squads={squads}
        act="Save"
        onDirty={setDirty}
        onSave={save}
        notice={
          <StaleNotice
            opened={opened}
            newer={newer}
            fields={athleteStaleFields(squads)}
            busy={change.isPending}
            onTakeTheirs={() => {
              takeTheirs()
              setDirty(false)
            }}
          />
        }
      />
    </Dialog>
  )
}

function valuesOf({ name, bornOn, recordedMassKg, squadIds }: Athlete): AthleteValues {
  return { name, bornOn, recordedMassKg, squadIds }
}
