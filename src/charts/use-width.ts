import { useEffect, useRef, useState } from 'react'

/** The width in pixels of the element that bears `ref`, followed as it changes; `initial` until it is measured. */
export function useWidth<E extends HTMLElement>(initial: number) {
  const ref = useRef<E>(null)
  const [width, setWidth] = useState(initial)
  useEffect(() => {
    const element = ref.current
    if (!element || typeof ResizeObserver === 'undefined') return
    const observer = new ResizeObserver((entries) => {
      const measured = Math.round(entries[0]?.contentRect.width ?? 0)
      if (measured > 0) setWidth(measured)
    })
    observer.observe(element)
    return () => observer.disconnect()
  }, [])
  return { ref, width }
}
