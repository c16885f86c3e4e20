import { useState } from 'react'
import type { Athlete } from '../../../shared/contracts/athletes.ts'
import { Squad } from '../../../shared/contracts/squads.ts'
import { useChangeSquad } from '../../api/squads/change-squad.ts'
import { useAnnounce } from '../../components/announcer.tsx'
import { Dialog } from '../../components/dialog.tsx'
import { StaleNotice, type StaleField } from '../../components/stale-notice.tsx'
import { changedValues } from '../../lib/changed-values.ts'
import { useStaleRow } from '../../lib/use-stale-row.ts'
import { SquadForm, type SquadValues } from './squad-form.tsx'

interface ChangeSquadDialogProps {
  squad: Squad
  athletes: Athlete[]
  onClose: () => void
}

export function ChangeSquadDialog({ squad, athletes, onClose }: ChangeSquadDialogProps) {
  const change = useChangeSquad()
  const announce = useAnnounce()
  const [dirty, setDirty] = useState(false)
  const { opened, newer, version, catchStale, takeTheirs } = useStaleRow(squad, Squad)

  const save = async (values: SquadValues) => {
    const body = { version, ...changedValues(valuesOf(opened), values) }
    try {
      const saved = await change.mutateAsync({ params: { squadId: opened.id }, body })
      announce({ text: `${saved.name} is saved.` })
      onClose()
    } catch (error) {
      catchStale(error)
    }
  }

  return (
    <Dialog title={`Change ${opened.name}`} onClose={onClose} dirty={dirty}>
      <SquadForm
        key={opened.version}
        values={valuesOf(opened)}
        athletes={athletes}
        act="Save"
        onDirty={setDirty}
        onSave={save}
        notice={
          <StaleNotice
            opened={opened}
            newer={newer}
            fields={staleFields(athletes)}
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
