import { truthOf } from '../../seed/synthetic/truth.ts'
import { analyse } from '../../shared/mechanics/analyse.ts'
import type { Figure, Test } from '../../shared/mechanics/types.ts'
import { CALIBRATION_U, coverageTrial } from './coverage-trials.ts'
import type { CoverageTrial } from './coverage-trials.ts'

/** Figures whose uncertainty is put to the proof. */
export const COVERED_METRICS = [
  'bodyWeight',
  'takeoffVelocity',
  'jumpHeightImpulse',
  'netImpulse',
  'timeToTakeoff',
  'landingPeakForce',
  'landingLoadingRate2080',
] as const

export type CoveredMetric = (typeof COVERED_METRICS)[number]

/** What the engine said of one figure of one trial, against the truth. */
interface Outcome {
  metric: CoveredMetric
  strata: CoverageTrial['strata']
  truth: number
  error: number
  U: number
}

/** How well the intervals of one figure hold. */
export interface Coverage {
  trials: number
  /** Share of trials whose interval holds the truth, of those that have one. */
  covered: number
  /** Share of trials without a value, and with a value but no interval. */
  missing: number
  withoutU: number
  /** Share without interval in the clean stratum. */
  cleanWithoutU: number
  bias: number
  sd: number
  medianU: number
  /** Median U over the half-width that holds 95 % of the errors. */
  widthRatio: number
  /** The stratum that is covered worst. */
  worst: { name: string; covered: number; trials: number }
  strata: Record<string, Stratum>
}

/** A kind of trials: how well its intervals hold, and how wide they are. */
export interface Stratum {
  trials: number
  covered: number
  sd: number
  widthRatio: number
}

const test: Test = { protocol: 'cmj', side: 'both', externalLoadKg: 0, boxHeightM: null, arms: 'hips' }

interface Tally {
  outcomes: Outcome[]
  missing: number
  withoutU: number
  clean: number
  cleanWithoutU: number
}

function quantile(values: number[], share: number): number {
  const sorted = values.slice().sort((a, b) => a - b)
  return sorted[Math.min(sorted.length - 1, Math.floor(share * sorted.length))] ?? NaN
}

const holds = ({ error, U }: Outcome): boolean => Math.abs(error) <= U
const share = (part: Outcome[]): number => part.filter(holds).length / part.length

function strataOf(outcomes: Outcome[]): Coverage['strata'] {
  const groups = new Map<string, Outcome[]>()
  for (const outcome of outcomes) {
    for (const [kind, name] of Object.entries(outcome.strata)) {
      const key = `${kind} ${name}`
      groups.set(key, [...(groups.get(key) ?? []), outcome])
    }
  }
  return Object.fromEntries([...groups].map(([name, part]) => [name, stratumOf(part)]))
}

function stratumOf(part: Outcome[]): Stratum {
  return { trials: part.length, covered: share(part), sd: spread(part).sd, widthRatio: widthRatio(part) }
}

function spread(part: Outcome[]): { bias: number; sd: number } {
  const bias = part.reduce((sum, { error }) => sum + error, 0) / part.length
  const variance = part.reduce((sum, { error }) => sum + (error - bias) ** 2, 0) / (part.length - 1)
  return { bias, sd: Math.sqrt(variance) }
}

const medianUOf = (part: Outcome[]): number =>
  quantile(
    part.map(({ U }) => U),
    0.5,
  )

function widthRatio(part: Outcome[]): number {
  const errors = part.map(({ error }) => Math.abs(error))
  return medianUOf(part) / quantile(errors, 0.95)
}

function coverageOf({ outcomes, missing, withoutU, clean, cleanWithoutU }: Tally, trials: number): Coverage {
  const strata = strataOf(outcomes)
  const [worst] = Object.entries(strata).sort(([, a], [, b]) => a.covered - b.covered)
  return {
    trials,
    covered: share(outcomes),
    missing: missing / trials,
    withoutU: withoutU / trials,
    cleanWithoutU: cleanWithoutU / Math.max(1, clean),
    ...spread(outcomes),
    medianU: medianUOf(outcomes),
    widthRatio: widthRatio(outcomes),
    worst: { name: worst?.[0] ?? '', covered: worst?.[1].covered ?? NaN, trials: worst?.[1].trials ?? 0 },
    strata,
  }
}

function figuresOf({ recording }: CoverageTrial): Record<string, Figure> {
  const calibrationU = Object.fromEntries(
    Object.keys(recording.channels).map((channel) => [channel, CALIBRATION_U]),
  )
  const { trials } = analyse(recording, { test, gravity: 9.80665, calibrationU })
  return trials[0]?.metrics ?? {}
}

/** The engine against the truth over the first `count` drawn trials, figure by figure. */
export function measureCoverage(count: number): Record<CoveredMetric, Coverage> {
  const tallies = new Map<CoveredMetric, Tally>(
    COVERED_METRICS.map((metric) => [
      metric,
      { outcomes: [], missing: 0, withoutU: 0, clean: 0, cleanWithoutU: 0 },
    ]),
  )
  for (let number = 0; number < count; number++) {
    const trial = coverageTrial(number)
    const truths = truthOf(trial.jump).metrics
    const figures = figuresOf(trial)
    for (const [metric, tally] of tallies) {
      const [truth, figure] = [truths[metric] ?? NaN, figures[metric]]
      const isClean = trial.strata.noise === 'clean'
      if (isClean) tally.clean++
      if (!figure) tally.missing++
      else if (figure.U === null) tally.withoutU++
      else
        tally.outcomes.push({ metric, strata: trial.strata, truth, error: figure.value - truth, U: figure.U })
      if (isClean && figure?.U == null) tally.cleanWithoutU++
    }
  }
  return Object.fromEntries(
    [...tallies].map(([metric, tally]) => [metric, coverageOf(tally, count)]),
  ) as Record<CoveredMetric, Coverage>
}

const percent = (value: number): string => `${(100 * value).toFixed(1)} %`

/** A row a figure: share covered, worst stratum, bias, SD, median U, width against the errors, without interval. */
export function coverageTable(coverage: Record<CoveredMetric, Coverage>): string {
  const head = [
    'figure',
    'covered',
    'worst stratum',
    'bias',
    'SD',
    'median U',
    'U / 95 % of errors',
    'no U',
    'missing',
  ]
  const rows = Object.entries(coverage).map(([metric, c]) => [
    metric,
    percent(c.covered),
    `${percent(c.worst.covered)} ${c.worst.name}`,
    c.bias.toPrecision(3),
    c.sd.toPrecision(3),
    c.medianU.toPrecision(3),
    c.widthRatio.toFixed(2),
    percent(c.withoutU),
    percent(c.missing),
  ])
  const widths = head.map((_, i) => Math.max(...[head, ...rows].map((row) => (row[i] ?? '').length)))
  return [head, ...rows].map((row) => row.map((cell, i) => cell.padEnd(widths[i] ?? 0)).join('  ')).join('\n')
}

/** A row a stratum of one figure. */
export function strataTable({ strata }: Coverage): string {
  return Object.entries(strata)
    .sort(([a], [b]) => a.localeCompare(b, 'en'))
    .map(([name, { trials, covered, sd, widthRatio: ratio }]) => {
      const columns = [name.padEnd(18), `${trials}`.padStart(5), percent(covered).padStart(8)]
      return [...columns, sd.toPrecision(3).padStart(8), ratio.toFixed(2).padStart(6)].join('  ')
    })
    .join('\n')
}

/** The coverage benchmark: 2,000 trials unless told otherwise. */
export function benchCoverage(count = 2000): { table: string; coverage: Record<CoveredMetric, Coverage> } {
  const coverage = measureCoverage(count)
  const title = `Coverage of U over ${count} synthetic countermovement jumps`
  const strata = COVERED_METRICS.map(
    (metric) => `${metric}: trials, covered, SD, U / 95 % of errors\n${strataTable(coverage[metric])}`,
  )
  return { table: [title, coverageTable(coverage), ...strata].join('\n\n'), coverage }
}
