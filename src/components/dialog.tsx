import { useId, useLayoutEffect, useRef, useState, type ReactNode } from 'react'
import { Button } from './button.tsx'

interface DialogProps {
  title: string
  onClose: () => void
  /** True while something typed would be lost: closing then asks first. */
  dirty?: boolean
  children: ReactNode
}

/**
 * A native modal dialog, open while mounted. Its form's first control has the focus, or else Close. Escape closes it,
 * and the focus goes back to where it was.
 */
export function Dialog({ title, onClose, dirty = false, children }: DialogProps) {
  const dialog = useRef<HTMLDialogElement>(null)
  const titleId = useId()
  const [asking, setAsking] = useState(false)

  // A layout effect: the browser gives the focus back only while the closing dialog is still in the page.
  useLayoutEffect(() => {
    const element = dialog.current
    element?.showModal()
    element?.querySelector<HTMLElement>('form :is(button, input, select, textarea):enabled')?.focus()
    return () => element?.close()
  }, [])

  const leave = () => (dirty && !asking ? setAsking(true) : onClose())

  return (
    <dialog
      ref={dialog}
      aria-labelledby={titleId}
      onCancel={(event) => {
        event.preventDefault()
        leave()
      }}
      // A browser lets a second Escape through without asking.
      onClose={() => dialog.current?.open === false && onClose()}
      className="m-auto max-h-[calc(100dvh-2rem)] w-[min(36rem,calc(100vw-2rem))] overflow-y-auto border-t-2 border-ink bg-sheet p-0 text-ink"
    >
      <div className="flex items-baseline justify-between gap-4 px-5 pt-4 pb-2">
        <h2 id={titleId} className="text-panel font-semibold">
          {title}
        </h2>
        <Button look="word" onClick={leave}>
          Close
        </Button>
      </div>
      {asking && <AskToDiscard onKeep={() => setAsking(false)} onDiscard={onClose} />}
      <div className="px-5 pb-5">{children}</div>
    </dialog>
  )
}

function AskToDiscard({ onKeep, onDiscard }: { onKeep: () => void; onDiscard: () => void }) {
  return (
    <div
      role="alert"
      className="mx-5 mb-3 border-s-4 border-caution bg-caution-ground px-3 py-2 text-caution"
    >
      <p className="font-semibold">Close and lose what you typed?</p>
      <div className="mt-1 flex gap-4 text-ink">
        <Button look="word" onClick={onKeep}>
          Keep editing
        </Button>
        <Button look="word" onClick={onDiscard}>
          Discard it
        </Button>
      </div>
    </div>
  )
}
