import type { ReactNode } from 'react'
import { classNames } from '../lib/class-names.ts'

interface ScrollRegionProps {
  /** What scrolls, for those who reach it by keyboard. */
  label: string
  className?: string
  children: ReactNode
}

/** Something wider than a phone, which scrolls within itself; a stop of the Tab key, so that keys can scroll it. */
export function ScrollRegion({ label, className, children }: ScrollRegionProps) {
  return (
    <div role="region" aria-label={label} tabIndex={0} className={classNames('overflow-x-auto', className)}>
      {children}
    </div>
  )
}
