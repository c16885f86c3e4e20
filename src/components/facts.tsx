import type { ReactNode } from 'react'

/** Names and values in two columns, a hairline between rows. */
export function Facts({ facts }: { facts: [name: string, value: ReactNode][] }) {
  return (
    <dl>
      {facts.map(([name, value]) => (
        <div
          key={name}
          className="flex flex-wrap justify-between gap-x-6 border-b border-rule-2 py-1.5 last:border-b-0"
        >
          <dt className="text-ink-2">{name}</dt>
          <dd className="min-w-0 break-words">{value}</dd>
        </div>
      ))}
    </dl>
  )
}
