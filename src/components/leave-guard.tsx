import { useEffect } from 'react'
import { useBlocker } from 'react-router-dom'
import { Button } from './button.tsx'
import { Dialog } from './dialog.tsx'

interface LeaveGuardProps {
  dirty: boolean
  /** What would be lost, as the beginning of a sentence. */
  what?: string
}

/** While `dirty`, asks before the page is left with something typed and unsaved. */
export function LeaveGuard({ dirty, what = 'What you typed on this page' }: LeaveGuardProps) {
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) => dirty && currentLocation.pathname !== nextLocation.pathname,
  )
  useEffect(() => {
    if (!dirty) return
    const ask = (event: BeforeUnloadEvent) => event.preventDefault()
    window.addEventListener('beforeunload', ask)
    return () => window.removeEventListener('beforeunload', ask)
  }, [dirty])

  if (blocker.state !== 'blocked') return null
  return (
    <Dialog title="Leave without saving?" onClose={blocker.reset}>
      <p className="pb-4">{what} is not saved yet.</p>
      <div className="flex flex-wrap gap-3">
        <Button look="main" onClick={blocker.reset}>
          Stay here
        </Button>
        <Button look="stop" onClick={blocker.proceed}>
          Leave and lose it
        </Button>
      </div>
    </Dialog>
  )
}
