import { useId, useRef, useState } from 'react'
import { Link } from 'react-router-dom'
import type { SheetTrial } from '../../../shared/contracts/sessions.ts'
import { massMetric } from '../../../shared/contracts/sheet-metrics.ts'
import { Button } from '../../components/button.tsx'
import { FormError } from '../../components/form-error.tsx'
import { focusNextRow } from '../../lib/focus-next-row.ts'
import { pathOf } from '../../lib/paths.ts'
import { figureWords } from '../results/metric-words.ts'
import { headlineMetric } from '../results/test-metrics.ts'
import type { AthleteChoice } from '../trials/move-trial-dialog.tsx'
import { useMoveTrial } from '../trials/use-trial-acts.ts'

/** A trial that no athlete could be told from: what was measured, and a choice of athlete. */
export function TrayTrial({ trial, athletes }: { trial: SheetTrial; athletes: readonly AthleteChoice[] }) {
  const { id, version, fileName } = trial
  const [chosen, setChosen] = useState('')
  const row = useRef<HTMLLIElement>(null)
  const acted = { id, version, words: fileName, athleteId: null }
  const { move, busy, error } = useMoveTrial(acted, () => focusNextRow(row.current))
  const selectId = useId()
  return (
    <li ref={row} className="border-b border-rule-2 py-1.5 text-small">
      <form
        className="flex flex-wrap items-center gap-x-3 gap-y-1"
        onSubmit={(event) => {
          event.preventDefault()
          if (chosen !== '') move(chosen)
        }}
      >
        <Link to={pathOf.trial(id)} className="font-semibold break-all">
          {fileName}
        </Link>
        <span className="text-ink-2">{measuredWords(trial)}</span>
        <span className="ms-auto flex items-center gap-2">
          <label htmlFor={selectId} className="sr-only">
            Athlete of {fileName}
          </label>
          <select
            id={selectId}
            className="control w-48!"
            value={chosen}
            onChange={(event) => setChosen(event.target.value)}
          >
            <option value="">Whose is it?</option>
            {athletes.map((athlete) => (
              <option key={athlete.athleteId} value={athlete.athleteId}>
                {athlete.name}
              </option>
            ))}
          </select>
          <Button type="submit" busy={busy} disabled={chosen === ''}>
            Assign <span className="sr-only">{fileName} to this athlete</span>
          </Button>
        </span>
      </form>
      <FormError error={error} />
    </li>
  )
}

/** Mass and the figure of the test help to tell whose it is. */
function measuredWords({ analysis, setAside, test }: SheetTrial): string {
  if (setAside) return `set aside: ${setAside.reason}`
  if (!analysis) return 'being analysed'
  const words = [massMetric, headlineMetric(test.protocol)].flatMap((key) => {
    const figure = analysis.metrics[key]
    return figure ? [figureWords(key, figure)] : []
  })
  return words.join(', ') || (analysis.worstSentence ?? 'no jump found')
}
