import { useState } from 'react'
import { startRecompute, type Scope } from '../../../shared/contracts/recomputes.ts'
import { useRoles } from '../../api/account/get-me.ts'
import { Button } from '../../components/button.tsx'
import { Dialog } from '../../components/dialog.tsx'
import { mayCall } from '../../lib/may-call.ts'
import { RecomputePanel } from './recompute-panel.tsx'

interface Props {
  scope: Scope
  /** Whose analyses, as the dialog's title says. */
  of: string
}

/** The way to recompute one session or one athlete, for whoever may. */
export function RecomputeEntry({ scope, of }: Props) {
  const mayStart = mayCall(startRecompute, useRoles())
  const [open, setOpen] = useState(false)
  if (!mayStart) return null
  return (
    <>
      <Button onClick={() => setOpen(true)}>Recompute</Button>
      {open && (
        <Dialog title={`Recompute ${of}`} onClose={() => setOpen(false)}>
          <RecomputePanel scope={scope} />
        </Dialog>
      )}
    </>
  )
}
