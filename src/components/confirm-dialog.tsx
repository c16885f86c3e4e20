import type { ReactNode } from 'react'
import { Button } from './button.tsx'
import { Dialog } from './dialog.tsx'
import { FormError } from './form-error.tsx'

interface ConfirmDialogProps {
  title: string
  /** What will follow, spelt out. */
  children: ReactNode
  /** The act as a verb: "Withdraw the invitation". */
  act: string
  onConfirm: () => void
  onClose: () => void
  busy: boolean
  error: unknown
}

/** Asks before an act that cannot be taken back by a press. */
export function ConfirmDialog({ title, children, act, onConfirm, onClose, busy, error }: ConfirmDialogProps) {
  return (
    <Dialog title={title} onClose={onClose}>
      <div className="flex flex-col gap-4">
        <div className="max-w-prose">{children}</div>
        <FormError error={error} />
        <div className="flex flex-wrap gap-3">
          <Button look="stop" onClick={onConfirm} busy={busy}>
            {act}
          </Button>
          <Button onClick={onClose}>Leave it as it is</Button>
        </div>
      </div>
    </Dialog>
  )
}
