import type { ReactNode } from 'react'
import { classNames } from '../lib/class-names.ts'

const toneClass = {
  plain: 'bg-band text-ink',
  caution: 'bg-caution-ground text-caution',
  stop: 'bg-stop-ground text-stop',
} as const

/** A word or two about the row it stands in. */
export function Tag({ tone = 'plain', children }: { tone?: keyof typeof toneClass; children: ReactNode }) {
  return (
    <span
      className={classNames(
        'inline-block rounded-control px-1.5 text-small whitespace-nowrap',
        toneClass[tone],
      )}
    >
      {children}
    </span>
  )
}
