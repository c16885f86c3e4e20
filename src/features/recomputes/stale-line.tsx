import { useStanding } from '../../api/recomputes/get-standing.ts'
import { staleSentence } from './standing-words.ts'

export const recomputeAnchor = 'recompute'

/** Under a form whose saving changes no number by itself: how many analyses were made otherwise, and the way on. */
export function StaleLine() {
  const { data } = useStanding({ kind: 'club' })
  if (!data || data.stale === 0) return null
  return (
    <p role="status" className="max-w-prose">
      {staleSentence(data)} Saving changes no figure by itself:{' '}
      <a href={`#${recomputeAnchor}`}>see what would move, and recompute</a>.
    </p>
  )
}
