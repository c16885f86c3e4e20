import { Fragment } from 'react'

/** What the letters of a formula mean; "W_sys" is set with its index below. */
export function Symbols({ text }: { text: string }) {
  const parts = text.split(/(\p{L}_[\p{L}\d]+)/u)
  return (
    <p className="max-w-prose text-small text-ink-2">
      {parts.map((part, i) => {
        const [letter, index] = part.split('_')
        if (index === undefined) return <Fragment key={i}>{part}</Fragment>
        return (
          <var key={i} className="not-italic">
            {letter}
            <sub>{index}</sub>
          </var>
        )
      })}
      .
    </p>
  )
}
