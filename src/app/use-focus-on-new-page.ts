import { useEffect, useRef, type RefObject } from 'react'
import { useLocation } from 'react-router-dom'

/** After a change of page the focus goes to its content, so that keyboard and screen reader start there. */
export function useFocusOnNewPage(): RefObject<HTMLElement | null> {
  const main = useRef<HTMLElement>(null)
  const { pathname } = useLocation()
  const seen = useRef(pathname)
  useEffect(() => {
    if (seen.current === pathname) return
    seen.current = pathname
    main.current?.focus({ preventScroll: true })
  }, [pathname])
  return main
}
