import { memo } from 'react'
import type { Analysis } from '../../../shared/contracts/trials.ts'
import { MethodLink } from '../../components/method-link.tsx'
import { Sheet } from '../../components/sheet.tsx'
import { Tag } from '../../components/tag.tsx'
import { groupWords } from './event-words.ts'
import { formatMeasured } from './format-measured.ts'
import { Was } from './was.tsx'

type Check = Analysis['checks'][number]

const order = { fail: 0, caution: 1, pass: 2 } as const

interface Props extends Pick<Analysis, 'checks' | 'notes'> {
  /** While events are being moved: the saved checks. */
  saved?: Analysis['checks'] | undefined
}

/** The quality checks: those to look at first, the others behind one line. */
export const TrialChecks = memo(function TrialChecks({ checks, notes, saved }: Props) {
  const sorted = [...checks].sort((a, b) => order[a.verdict] - order[b.verdict])
  const looks = sorted.filter((check) => check.verdict !== 'pass')
  const passes = sorted.filter((check) => check.verdict === 'pass')
  return (
    <Sheet title="Trial checks">
      {looks.length > 0 && (
        <ul>
          {looks.map((check) => (
            <CheckToLookAt key={check.key} check={check} saved={saved} />
          ))}
        </ul>
      )}
      {passes.length > 0 && (
        <details className="py-1">
          <summary className="cursor-pointer text-ink-2">
            {looks.length === 0 ? `All ${passes.length} pass` : `${passes.length} more, all pass`}
          </summary>
          <ul>
            {passes.map((check) => (
              <li
                key={check.key}
                className="flex justify-between gap-4 border-b border-rule-2 py-1 text-small"
              >
                <span>
                  <MethodLink noteKey={check.key}>{check.sentence}</MethodLink>
                  <WasVerdict check={check} saved={saved} />
                </span>
                <Measured check={check} />
              </li>
            ))}
          </ul>
        </details>
      )}
      {notes.length > 0 && (
        <ul aria-label="Notes" className="pt-1 text-small text-ink-2">
          {notes.map((note, i) => (
            <li key={i}>{note.sentence}</li>
          ))}
        </ul>
      )}
    </Sheet>
  )
})

const verdictWords = { pass: 'pass', caution: 'look', fail: 'failed' } as const

function WasVerdict({ check, saved }: { check: Check; saved: Check[] | undefined }) {
  if (!saved) return null
  const before = saved.find(({ key }) => key === check.key)
  return <Was saved={before ? verdictWords[before.verdict] : 'not made'} now={verdictWords[check.verdict]} />
}

function CheckToLookAt({ check, saved }: { check: Check; saved: Check[] | undefined }) {
  const affects = check.affects.map((group) => groupWords[group].toLowerCase())
  return (
    <li className="border-b border-rule-2 py-1.5">
      <div className="flex justify-between gap-4">
        <span>
          <Tag tone={check.verdict === 'fail' ? 'stop' : 'caution'}>{verdictWords[check.verdict]}</Tag>{' '}
          <MethodLink noteKey={check.key}>{check.sentence}</MethodLink>
          <WasVerdict check={check} saved={saved} />
        </span>
        <Measured check={check} />
      </div>
      <p className="text-small text-ink-2">
        {check.limit !== null && `Limit ${formatMeasured(check.limit, check.unit)}. `}
        {affects.length > 0 &&
          `${check.verdict === 'fail' ? 'Takes away' : 'Touches'}: ${affects.join(', ')}. `}
        {check.remedy}
      </p>
    </li>
  )
}

function Measured({ check }: { check: Check }) {
  if (check.measured === null) return null
  return <span className="text-small whitespace-nowrap">{formatMeasured(check.measured, check.unit)}</span>
}
