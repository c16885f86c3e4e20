import { useState } from 'react'
import type { Squad } from '../../../shared/contracts/squads.ts'
import { useCreateAthlete } from '../../api/athletes/create-athlete.ts'
import { useAnnounce } from '../../components/announcer.tsx'
import { Dialog } from '../../components/dialog.tsx'
import { AthleteForm } from './athlete-form.tsx'

const nobodyYet = { name: '', bornOn: null, recordedMassKg: null, squadIds: [] }

export function AddAthleteDialog({ squads, onClose }: { squads: Squad[]; onClose: () => void }) {
  const create = useCreateAthlete()
  const announce = useAnnounce()
  const [dirty, setDirty] = useState(false)
  return (
    <Dialog title="Add an athlete" onClose={onClose} dirty={dirty}>
      <AthleteForm
        values={nobodyYet}
        squads={squads}
        act="Add the athlete"
        onDirty={setDirty}
        onSave={async (body) => {
          const athlete = await create.mutateAsync({ body })
          announce({ text: `${athlete.name} is on the roster.` })
          onClose()
        }}
      />
    </Dialog>
  )
}
