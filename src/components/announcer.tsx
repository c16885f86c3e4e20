import { createContext, use, useCallback, useMemo, useState, type ReactNode } from 'react'
import { Button } from './button.tsx'

interface Announcement {
  text: string
  /** Takes the act back. */
  undo?: () => void
}

const AnnounceContext = createContext<(announcement: Announcement) => void>(() => {})

/** Says that an act is done, at the foot of the page, with a way to take it back where there is one. */
export function useAnnounce() {
  return use(AnnounceContext)
}

export function Announcer({ children }: { children: ReactNode }) {
  const [announcement, setAnnouncement] = useState<Announcement | null>(null)
  const dismiss = useCallback(() => setAnnouncement(null), [])
  const announce = useMemo(() => (next: Announcement) => setAnnouncement(next), [])
  return (
    <AnnounceContext value={announce}>
      {children}
      <div role="status" className="no-print fixed inset-x-0 bottom-0 z-10 flex justify-center">
        {announcement !== null && (
          <div className="m-3 flex flex-wrap items-center gap-x-4 border border-ink bg-sheet px-4 py-1.5">
            <p>{announcement.text}</p>
            {announcement.undo !== undefined && (
              <Button
                look="word"
                onClick={() => {
                  dismiss()
                  announcement.undo?.()
                }}
              >
                Undo
              </Button>
            )}
            <Button look="word" onClick={dismiss}>
              Dismiss
            </Button>
          </div>
        )}
      </div>
    </AnnounceContext>
  )
}
