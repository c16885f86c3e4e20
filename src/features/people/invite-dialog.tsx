import { useState } from 'react'
import type { Athlete } from '../../../shared/contracts/athletes.ts'
import { useInvitePerson } from '../../api/people/invite-person.ts'
import { useAnnounce } from '../../components/announcer.tsx'
import { Dialog } from '../../components/dialog.tsx'
import { InviteForm } from './invite-form.tsx'

export function InviteDialog({ athletes, onClose }: { athletes: Athlete[]; onClose: () => void }) {
  const invite = useInvitePerson()
  const announce = useAnnounce()
  const [dirty, setDirty] = useState(false)
  return (
    <Dialog title="Invite somebody" onClose={onClose} dirty={dirty}>
      <InviteForm
        athletes={athletes}
        onDirty={() => setDirty(true)}
        onInvite={async (body) => {
          const invitation = await invite.mutateAsync({ body })
          announce({ text: `An invitation is on its way to ${invitation.email}.` })
          onClose()
        }}
      />
    </Dialog>
  )
}
