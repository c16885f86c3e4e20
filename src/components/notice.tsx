import type { ReactNode } from 'react'
import { classNames } from '../lib/class-names.ts'

interface NoticeProps {
  tone: 'plain' | 'caution' | 'stop'
  /** `alert` is read out at once; leave it out for what stands there from the start. */
  role?: 'alert' | 'status'
  title?: string
  children?: ReactNode
}

const toneClass = {
  plain: 'border-ink bg-sheet',
  caution: 'border-caution bg-caution-ground text-caution',
  stop: 'border-stop bg-stop-ground text-stop',
} as const

/** A sentence that must not be missed. The words say it; the colour only helps to find it. */
export function Notice({ tone, role, title, children }: NoticeProps) {
  return (
    <div role={role} className={classNames('flex flex-col gap-1 border-s-4 px-3 py-2', toneClass[tone])}>
      {title !== undefined && <p className="font-semibold">{title}</p>}
      {children}
    </div>
  )
}
