import type { ReactNode } from 'react'

interface EmptyStateProps {
  title: string
  /** What to do next. */
  children?: ReactNode
  action?: ReactNode
}

export function EmptyState({ title, children, action }: EmptyStateProps) {
  return (
    <div className="flex flex-col items-start gap-3 px-3 py-6">
      <p className="font-semibold">{title}</p>
      {children !== undefined && <p className="max-w-prose text-ink-2">{children}</p>}
      {action}
    </div>
  )
}
