import { worstOf } from './coverage.ts'
import type { Coverage, Stratum } from './coverage.ts'

const percent = (value: number): string => `${(100 * value).toFixed(1)} %`

function table(rows: string[][]): string {
  const widths = rows[0]?.map((_, i) => Math.max(...rows.map((row) => (row[i] ?? '').length))) ?? []
  const line = (row: string[]): string => row.map((cell, i) => cell.padEnd(widths[i] ?? 0)).join('  ')
  return rows.map((row) => line(row).trimEnd()).join('\n')
}

const numbers = ({ bias, sd, medianU, widthRatio, withoutU, missing }: Stratum): string[] => [
  bias.toPrecision(3),
  sd.toPrecision(3),
  medianU.toPrecision(3),
  widthRatio.toFixed(2),
  percent(withoutU),
  percent(missing),
]

const headings = ['bias', 'SD', 'median U', 'U / 95 % of errors', 'no U', 'missing']

/** A row a figure: share covered, worst stratum, bias, SD, median U, width against the errors, without interval. */
export function coverageTable(coverage: Record<string, Coverage>): string {
  const rows = Object.entries(coverage).map(([metric, of]) => {
    const worst = worstOf(of)
    return [metric, percent(of.covered), `${percent(worst.covered)} ${worst.name}`, ...numbers(of)]
  })
  return table([['figure', 'covered', 'worst stratum', ...headings], ...rows])
}

/** A row a stratum of one figure. */
export function strataTable(metric: string, { strata }: Coverage): string {
  const rows = Object.entries(strata)
    .sort(([a], [b]) => a.localeCompare(b, 'en'))
    .map(([name, of]) => [name, `${of.trials}`, percent(of.covered), ...numbers(of)])
  return table([[metric, 'trials', 'covered', ...headings], ...rows])
}
