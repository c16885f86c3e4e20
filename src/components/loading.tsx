import { useEffect, useState } from 'react'

/** Long enough that a quick answer shows no flicker. */
const quietMs = 250

/** Says what is being fetched, once it takes long enough to notice. */
export function Loading({ what }: { what: string }) {
  const [late, setLate] = useState(false)
  useEffect(() => {
    const timer = setTimeout(() => setLate(true), quietMs)
    return () => clearTimeout(timer)
  }, [])
  return (
    <p role="status" className="py-6 text-ink-2">
      <span className={late ? undefined : 'invisible'}>Loading {what}…</span>
    </p>
  )
}
