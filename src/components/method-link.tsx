import type { ReactNode } from 'react'
import { Link } from 'react-router-dom'
import { pathOf } from '../lib/paths.ts'

/** The name of a metric, or the sentence of a check, as a quiet link to its Method note. */
export function MethodLink({ noteKey, children }: { noteKey: string; children: ReactNode }) {
  return (
    <Link to={pathOf.method(noteKey)} className="decoration-rule decoration-dotted hover:decoration-ink">
      {children}
    </Link>
  )
}
