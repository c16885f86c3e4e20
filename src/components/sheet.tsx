import { useId, type ReactNode } from 'react'
import { classNames } from '../lib/class-names.ts'

interface SheetProps {
  /** Names the region; without it the sheet is a plain block. */
  title?: string
  titleAside?: ReactNode
  actions?: ReactNode
  /** Tables run to the sheet's edge. */
  flush?: boolean
  className?: string
  children: ReactNode
}

/** A sheet on the floor: near-white, one heavy rule along the top. */
export function Sheet({ title, titleAside, actions, flush = false, className, children }: SheetProps) {
  const id = useId()
  const hasHead = title !== undefined || actions !== undefined
  return (
    <section
      aria-labelledby={title === undefined ? undefined : id}
      className={classNames('border-t-2 border-ink bg-sheet', !flush && 'px-4 py-3', className)}
    >
      {hasHead && (
        <div
          className={classNames(
            'flex flex-wrap items-baseline justify-between gap-x-4 gap-y-1',
            flush ? 'px-3 pt-3 pb-1' : 'pb-2',
          )}
        >
          {title !== undefined && (
            <h2 id={id} className="text-panel font-semibold">
              {title}
              {titleAside !== undefined && (
                <span className="text-small font-normal text-ink-2"> {titleAside}</span>
              )}
            </h2>
          )}
          {actions !== undefined && <div className="no-print flex flex-wrap gap-3">{actions}</div>}
        </div>
      )}
      {children}
    </section>
  )
}
