import type { Trial } from '../../../shared/contracts/trials.ts'
import { catalogue, metricKeys } from '../../../shared/mechanics/catalogue.ts'
import { csvLine } from './csv.ts'

const ABOUT = [
  'File',
  'Samples',
  'Athlete',
  'Protocol',
  'Side',
  'External load (kg)',
  'Box (m)',
  'Arms',
  'Set aside',
  'Engine',
]

/** One line a trial: what it was, and every figure in the catalogue's units with its expanded uncertainty. */
export function figuresCsv(trials: readonly { trial: Trial; samplesPath: string }[]): string {
  const keys = metricKeys.filter((key) => trials.some(({ trial }) => trial.analysis?.metrics[key]))
  const headings = keys.flatMap((key) => {
    const { unit } = catalogue[key]
    return [unit ? `${key} (${unit})` : key, `${key} U`, `${key} withheld`]
  })
  const lines = trials.map(({ trial, samplesPath }) => {
    const { test, analysis } = trial
    const figures = keys.flatMap((key) => {
      const figure = analysis?.metrics[key]
      if (!figure) return [null, null, null]
      return [figure.value, figure.U, analysis?.withheld.includes(key) ? 'failed check' : null]
    })
    return csvLine([
      trial.fileName,
      samplesPath,
      trial.athlete?.name ?? null,
      test.protocol,
      test.side,
      test.externalLoadKg,
      test.boxHeightM,
      test.arms,
      trial.setAside?.reason ?? null,
      analysis?.engineVersion ?? null,
      ...figures,
    ])
  })
  return csvLine([...ABOUT, ...headings]) + lines.join('')
}
