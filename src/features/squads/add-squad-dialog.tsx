import { useState } from 'react'
import type { Athlete } from '../../../shared/contracts/athletes.ts'
import { useCreateSquad } from '../../api/squads/create-squad.ts'
import { useAnnounce } from '../../components/announcer.tsx'
import { Dialog } from '../../components/dialog.tsx'
import { SquadForm } from './squad-form.tsx'

const emptySquad = { name: '', athleteIds: [] }

export function AddSquadDialog({ athletes, onClose }: { athletes: Athlete[]; onClose: () => void }) {
  const create = useCreateSquad()
  const announce = useAnnounce()
  const [dirty, setDirty] = useState(false)
  return (
    <Dialog title="Add a squad" onClose={onClose} dirty={dirty}>
      <SquadForm
        values={emptySquad}
        athletes={athletes}
        act="Add the squad"
        onDirty={setDirty}
        onSave={async (body) => {
          const squad = await create.mutateAsync({ body })
          announce({ text: `${squad.name} is there.` })
          onClose()
        }}
      />
    </Dialog>
  )
}
