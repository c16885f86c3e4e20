import { useEndSubscription } from '../../api/billing/end-subscription.ts'
import { useAnnounce } from '../../components/announcer.tsx'
import { ConfirmDialog } from '../../components/confirm-dialog.tsx'

interface EndDialogProps {
  version: number
  /** End of the period, in words. */
  until: string
  onClose: () => void
}

export function EndDialog({ version, until, onClose }: EndDialogProps) {
  const end = useEndSubscription()
  const announce = useAnnounce()
  const confirm = () =>
    end.mutate(
      { body: { version, ends: true } },
      {
        onSuccess: () => {
          announce({ text: `The subscription ends on ${until}.` })
          onClose()
        },
      },
    )
  return (
    <ConfirmDialog
      title={`End the subscription on ${until}?`}
      act="End the subscription"
      onConfirm={confirm}
      onClose={onClose}
      busy={end.isPending}
      error={end.error}
    >
      Everything works until then. After that the club can only read: nothing is deleted, and buying seats
      opens it again. Until that day you can take this back.
    </ConfirmDialog>
  )
}
