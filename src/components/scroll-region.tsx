import { useEffect, useRef, useState, type ReactNode } from 'react'
import { classNames } from '../lib/class-names.ts'
import './scroll-region.css'

interface ScrollRegionProps {
  /** What scrolls, for those who reach it by keyboard. */
  label: string
  className?: string
  children: ReactNode
}

/**
 * Something wider than a phone, which scrolls within itself; a stop of the Tab key, so that keys can scroll it. While
 * more of it lies to the right, its edge says so.
 */
export function ScrollRegion({ label, className, children }: ScrollRegionProps) {
  const { ref, more, look } = useMoreAtRight()
  return (
    <div className={classNames('scroll-frame', className)} data-more={more || undefined}>
      <div
        ref={ref}
        role="region"
        aria-label={label}
        tabIndex={0}
        className="overflow-x-auto"
        onScroll={look}
      >
        {children}
      </div>
    </div>
  )
}

/** Whether some of an element lies beyond its right edge, followed as it scrolls and as it or its content changes. */
function useMoreAtRight() {
  const ref = useRef<HTMLDivElement>(null)
  const [more, setMore] = useState(false)
  const look = () => {
    const element = ref.current
    // A pixel less: widths are rounded.
    if (element) setMore(element.scrollLeft + element.clientWidth < element.scrollWidth - 1)
  }
  useEffect(() => {
    const element = ref.current
    if (!element || typeof ResizeObserver === 'undefined') return
    const observer = new ResizeObserver(look)
    for (const watched of [element, ...element.children]) observer.observe(watched)
    return () => observer.disconnect()
  }, [])
  return { ref, more, look }
}
