import { createContext, use, useCallback, useEffect, useId, useState, type ReactNode } from 'react'
import { LeaveGuard } from '../../components/leave-guard.tsx'

const UnsavedContext = createContext<(form: string, unsaved: boolean) => void>(() => {})

/** One guard for all forms of a page: a router asks in one place only. */
export function GuardUnsaved({ children }: { children: ReactNode }) {
  const [forms, setForms] = useState<readonly string[]>([])
  const tell = useCallback(
    (form: string, unsaved: boolean) =>
      setForms((before) => {
        const others = before.filter((other) => other !== form)
        return unsaved ? [...others, form] : others.length === before.length ? before : others
      }),
    [],
  )
  return (
    <UnsavedContext value={tell}>
      {children}
      <LeaveGuard dirty={forms.length > 0} />
    </UnsavedContext>
  )
}

/** Says whether this form holds something that leaving would lose. */
export function useUnsaved(unsaved: boolean): void {
  const form = useId()
  const tell = use(UnsavedContext)
  useEffect(() => {
    tell(form, unsaved)
    return () => tell(form, false)
  }, [tell, form, unsaved])
}
