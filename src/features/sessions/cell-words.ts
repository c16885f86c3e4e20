import type { SheetTrial } from '../../../shared/contracts/sessions.ts'
import { figureWords, noFigureWords } from '../results/metric-words.ts'
import { headlineMetric } from '../results/test-metrics.ts'

/** "1 failed check, 2 to look at", or null where all pass. */
export function checkWords(analysis: NonNullable<SheetTrial['analysis']>): string | null {
  const { fails, cautions } = analysis
  const parts = [fails > 0 ? `${fails} failed` : '', cautions > 0 ? `${cautions} to look at` : '']
  return parts.filter(Boolean).join(', ') || null
}

/** What a cell says, for those who cannot see it: whose trial, which, its figure, what is wrong with it. */
export function cellName(athleteName: string, n: number, trial: SheetTrial): string {
  return [`${athleteName}, trial ${n}`, ...stateWords(trial)].join(', ')
}

function stateWords({ analysis, setAside, test }: SheetTrial): string[] {
  if (setAside) return [`set aside: ${setAside.reason}`]
  if (!analysis) return ['being analysed']
  const metric = headlineMetric(test.protocol)
  const figure = analysis.metrics[metric]
  const withheld = analysis.withheld.includes(metric)
  return [
    figure === undefined
      ? noFigureWords(metric)
      : `${withheld ? 'withheld ' : ''}${figureWords(metric, figure)}`,
    checkWords(analysis),
    analysis.worstSentence,
  ].filter((words) => words !== null)
}
