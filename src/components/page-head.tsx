import type { ReactNode } from 'react'

interface PageHeadProps {
  title: string
  /** Who, when, file, plate: one quiet line above the title. */
  context?: ReactNode
  /** Stands behind the title, smaller and quieter: an uncertainty, a count. */
  aside?: ReactNode
  /** At the right; the one main action filled. */
  actions?: ReactNode
}

/** A page's head. Its title is the document's title too. */
export function PageHead({ title, context, aside, actions }: PageHeadProps) {
  return (
    <header className="flex flex-wrap items-end justify-between gap-x-6 gap-y-3 pt-6 pb-5">
      <title>{`${title} · Underfoot`}</title>
      <div className="min-w-0">
        {context !== undefined && <p className="text-ink-2">{context}</p>}
        <h1 className="text-page font-semibold text-balance break-words">
          {title}
          {aside !== undefined && aside !== false && (
            <span className="text-panel font-normal text-ink-2"> {aside}</span>
          )}
        </h1>
      </div>
      {actions !== undefined && actions !== false && (
        <div className="no-print flex flex-wrap items-center gap-3">{actions}</div>
      )}
    </header>
  )
}
