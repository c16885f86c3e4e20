import type { Outcome } from './coverage-outcomes.ts'

/** A kind of trials: how well its intervals hold, and how wide they are. */
export interface Stratum {
  trials: number
  /** Share of trials whose interval holds the truth, of those that have one. */
  covered: number
  bias: number
  sd: number
  medianU: number
  /** Median U over the Monte-Carlo half-width: the one that holds 95 % of the errors. */
  widthRatio: number
  /** Share of trials without a value, and with a value but no interval. */
  missing: number
  withoutU: number
}

/** How well the intervals of one figure hold, over all trials and by kind, e.g. `noise clean`. */
export interface Coverage extends Stratum {
  strata: Record<string, Stratum>
}

function quantile(values: number[], share: number): number {
  const sorted = values.slice().sort((a, b) => a - b)
  return sorted[Math.min(sorted.length - 1, Math.floor(share * sorted.length))] ?? NaN
}

const mean = (values: number[]): number => values.reduce((sum, value) => sum + value, 0) / values.length

function stratumOf(outcomes: Outcome[]): Stratum {
  const measured = outcomes.flatMap(({ error, U }) => (error === null || U === null ? [] : [{ error, U }]))
  const errors = measured.map(({ error }) => error)
  const bias = mean(errors)
  const squares = errors.reduce((sum, error) => sum + (error - bias) ** 2, 0)
  const medianU = quantile(
    measured.map(({ U }) => U),
    0.5,
  )
  const missing = outcomes.filter(({ error }) => error === null).length
  return {
    trials: outcomes.length,
    covered: measured.filter(({ error, U }) => Math.abs(error) <= U).length / measured.length,
    bias,
    sd: Math.sqrt(squares / (errors.length - 1)),
    medianU,
    widthRatio: medianU / quantile(errors.map(Math.abs), 0.95),
    missing: missing / outcomes.length,
    withoutU: (outcomes.length - missing - measured.length) / outcomes.length,
  }
}

function grouped<K extends string>(outcomes: Outcome[], keysOf: (outcome: Outcome) => K[]): [K, Outcome[]][] {
  const groups = new Map<K, Outcome[]>()
  for (const outcome of outcomes) {
    for (const key of keysOf(outcome)) {
      const group = groups.get(key)
      if (group) group.push(outcome)
      else groups.set(key, [outcome])
    }
  }
  return [...groups]
}

function coverageOf(outcomes: Outcome[]): Coverage {
  const strata = grouped(outcomes, ({ strata: kinds }) =>
    Object.entries(kinds).map(([kind, name]) => `${kind} ${name}`),
  )
  return {
    ...stratumOf(outcomes),
    strata: Object.fromEntries(strata.map(([name, part]) => [name, stratumOf(part)])),
  }
}

/** Figure by figure. */
export function coverageByMetric(outcomes: Outcome[]): Record<string, Coverage> {
  return Object.fromEntries(
    grouped(outcomes, ({ metric }) => [metric]).map(([metric, part]) => [metric, coverageOf(part)]),
  )
}

/** The stratum that is covered worst. */
export function worstOf({ strata }: Coverage): { name: string } & Stratum {
  const [worst] = Object.entries(strata).sort(([, a], [, b]) => a.covered - b.covered)
  if (!worst) throw new RangeError('There are no trials.')
  return { name: worst[0], ...worst[1] }
}
