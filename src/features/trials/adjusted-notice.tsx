import { useState } from 'react'
import type { EventMove } from '../../../shared/contracts/moved-events.ts'
import type { Trial } from '../../../shared/contracts/trials.ts'
import { useMe } from '../../api/account/get-me.ts'
import { isBeingAnalysed } from '../../api/trials/get-trial.ts'
import { Button } from '../../components/button.tsx'
import { Notice } from '../../components/notice.tsx'
import { formatMoment } from '../../lib/format-date.ts'
import { BackToAutomaticDialog } from './back-to-automatic-dialog.tsx'
import { moveLines } from './moved-words.ts'

interface Props {
  trial: Trial
  /** Off while events are being moved: there the handles do it. */
  mayPutBack: boolean
}

/** Which events a person moved, from where to where, who, when and why; and every earlier move. */
export function AdjustedNotice({ trial, mayPutBack }: Props) {
  const [asking, setAsking] = useState(false)
  const [current, ...earlier] = trial.eventMoves
  if (!current) return null
  const adjusted = Object.keys(current.events).length > 0
  const waiting = isBeingAnalysed(trial)
  return (
    <div className="pb-4">
      <Notice tone="plain" title={adjusted ? 'Adjusted by hand' : 'Back to automatic'}>
        <MoveWords move={current} />
        {waiting && (
          <p role="status">
            The figures are being computed anew; those below are still the ones from before.
          </p>
        )}
        {adjusted && mayPutBack && (
          <div>
            <Button look="word" onClick={() => setAsking(true)}>
              Put all events back to automatic
            </Button>
          </div>
        )}
        {earlier.length > 0 && (
          <details className="text-small">
            <summary className="cursor-pointer">
              {earlier.length} earlier {earlier.length === 1 ? 'move' : 'moves'}
            </summary>
            <ol>
              {earlier.map((move) => (
                <li key={move.at} className="border-b border-rule-2 py-1">
                  <MoveWords move={move} />
                </li>
              ))}
            </ol>
          </details>
        )}
      </Notice>
      {asking && <BackToAutomaticDialog trial={trial} onClose={() => setAsking(false)} />}
    </div>
  )
}

function MoveWords({ move }: { move: EventMove }) {
  const timeZone = useMe().data?.club.timeZone ?? 'UTC'
  return (
    <>
      <p>
        {move.byName}, {formatMoment(move.at, timeZone)}: {moveLines(move).join('; ')}.
      </p>
      {move.reason !== null && <p className="text-ink-2">Reason: {move.reason}</p>}
    </>
  )
}
