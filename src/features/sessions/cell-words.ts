import type { SheetTrial } from '../../../shared/contracts/sessions.ts'
import { figureWords } from '../results/metric-words.ts'

/** The metric that a sheet's cell shows. */
export const cellMetric = 'jumpHeightImpulse'

/** "1 failed check, 2 to look at", or null where all pass. */
export function checkWords(analysis: NonNullable<SheetTrial['analysis']>): string | null {
  const { fails, cautions } = analysis
  const parts = [fails > 0 ? `${fails} failed` : '', cautions > 0 ? `${cautions} to look at` : '']
  return parts.filter(Boolean).join(', ') || null
}

/** What a cell says, for those who cannot see it: whose trial, which, its height, what is wrong with it. */
export function cellName(athleteName: string, n: number, trial: SheetTrial): string {
  return [`${athleteName}, trial ${n}`, ...stateWords(trial)].join(', ')
}

function stateWords({ analysis, setAside }: SheetTrial): string[] {
  if (setAside) return [`set aside: ${setAside.reason}`]
  if (!analysis) return ['being analysed']
  const height = analysis.metrics[cellMetric]
  const withheld = analysis.withheld.includes(cellMetric)
  return [
    height === undefined
      ? 'no jump height'
      : `${withheld ? 'withheld ' : ''}${figureWords(cellMetric, height)}`,
    checkWords(analysis),
    analysis.worstSentence,
  ].filter((words) => words !== null)
}
