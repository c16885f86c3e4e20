import type { MouseEvent } from 'react'
import { Link } from 'react-router-dom'
import type { SheetTrial } from '../../../shared/contracts/sessions.ts'
import { Sparkline } from '../../charts/sparkline.tsx'
import { Button } from '../../components/button.tsx'
import { Tag } from '../../components/tag.tsx'
import { pathOf } from '../../lib/paths.ts'
import { FigureText } from '../results/figure-text.tsx'
import { noFigureWords } from '../results/metric-words.ts'
import { headlineMetric } from '../results/test-metrics.ts'
import { useTakeBack, type ActedTrial } from '../trials/use-trial-acts.ts'
import { cellName, checkWords } from './cell-words.ts'
import type { SheetCursor } from './use-sheet-cursor.ts'

/** What may be done to a trial from its cell. */
export interface CellActs {
  setAside: (trial: ActedTrial) => void
  move: (trial: ActedTrial) => void
}

interface Props {
  trial: SheetTrial
  athleteName: string
  n: number
  focus: ReturnType<SheetCursor['cellProps']>
  acts: CellActs
}

/** A trial on the sheet: its trace, the figure of its test, its checks in words. Opens it; x sets it aside, m moves it. */
export function TrialCell({ trial, athleteName, n, focus, acts }: Props) {
  const { id, version, athleteId } = trial
  const acted = { id, version, athleteId, words: `trial ${n} of ${athleteName}` }
  const { takeBack } = useTakeBack(acted)
  const aside = () => (trial.setAside ? takeBack(version) : acts.setAside(acted))
  return (
    <td className={trial.setAside ? 'trial-cell hatched' : 'trial-cell'}>
      <Link
        {...focus}
        to={pathOf.trial(id)}
        aria-keyshortcuts="x m"
        className="flex min-h-11 items-center gap-2 px-2 no-underline"
        onKeyDown={(event) => {
          if (event.ctrlKey || event.altKey || event.metaKey) return
          if (event.key === 'x') aside()
          if (event.key === 'm') acts.move(acted)
        }}
      >
        <span className="sr-only">{cellName(athleteName, n, trial)}</span>
        <Sparkline preview={trial.preview} quiet={trial.setAside !== null} />
        <span aria-hidden="true">
          <CellFigures trial={trial} />
        </span>
      </Link>
      <span className="cell-acts no-print" onClickCapture={focusCell}>
        <Button
          look="word"
          tabIndex={-1}
          aria-label={`${trial.setAside ? 'Take back' : 'Set aside'} ${acted.words}`}
          onClick={aside}
        >
          {trial.setAside ? 'take back' : 'set aside'}
        </Button>
        <Button look="word" tabIndex={-1} aria-label={`Move ${acted.words}`} onClick={() => acts.move(acted)}>
          move
        </Button>
      </span>
    </td>
  )
}

/** The words that act go when the pointer does: the focus comes back to the trial itself. */
function focusCell(event: MouseEvent<HTMLElement>) {
  event.currentTarget.closest('td')?.querySelector('a')?.focus()
}

function CellFigures({ trial: { setAside, analysis, test } }: { trial: SheetTrial }) {
  if (setAside)
    return (
      <span className="line-clamp-2 text-small leading-tight text-ink-2">set aside: {setAside.reason}</span>
    )
  if (!analysis) return <span className="text-small text-ink-2">being analysed</span>
  const metric = headlineMetric(test.protocol)
  const figure = analysis.metrics[metric]
  const words = checkWords(analysis)
  const withheld = analysis.withheld.includes(metric)
  return (
    <span className="flex flex-col items-start">
      {figure === undefined ? (
        <span className="text-small text-ink-2">{noFigureWords(metric)}</span>
      ) : (
        <span className={withheld ? 'text-ink-2 line-through' : undefined}>
          <FigureText metricKey={metric} figure={figure} strong={!withheld} />
        </span>
      )}
      {words !== null && <Tag tone={analysis.fails > 0 ? 'stop' : 'caution'}>{words}</Tag>}
    </span>
  )
}
