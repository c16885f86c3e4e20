import { worstOf } from './coverage.ts'
import type { Coverage } from './coverage.ts'

/** What intervals for 95 % are held to. */
export const limits = {
  overall: { least: 0.93, most: 0.97 },
  stratum: 0.9,
  /** Median U over the Monte-Carlo half-width. */
  width: 1.3,
  withoutU: 0.02,
  /** Of the takeoff velocity, m/s: its bias anywhere, and its SD in the clean laboratory. */
  velocityBias: 0.005,
  laboratorySd: 0.0033,
}

/** Figures that are not asked to be narrow: their intervals may err on the careful side. */
const careful: readonly string[] = ['dropVelocity', 'effectiveDropHeight']

/** A share truly at its limit fails a check of few trials with this probability. The seeds are fixed: no flicker. */
const CHANCE = 0.002

/** Smallest share of `n` that a true share `p` undershoots with at most the given chance (exact binomial). */
export function leastShare(n: number, p: number, chance = CHANCE): number {
  let term = (1 - p) ** n
  let cumulative = term
  let successes = 0
  while (cumulative < chance && successes < n) {
    successes++
    term *= ((n - successes + 1) / successes) * (p / (1 - p))
    cumulative += term
  }
  return successes / n
}

const percent = (value: number): string => `${(100 * value).toFixed(1)} %`

/** Limits that a figure's coverage over many trials breaks, in words; none where all hold. */
export function brokenLimits(metric: string, coverage: Coverage): string[] {
  const { covered, widthRatio, withoutU, missing, bias } = coverage
  const worst = worstOf(coverage)
  const clean = coverage.strata['noise clean']
  const checks: [boolean, string][] = [
    [covered < limits.overall.least, `covers only ${percent(covered)}`],
    [covered > limits.overall.most && !careful.includes(metric), `covers as much as ${percent(covered)}`],
    [worst.covered < limits.stratum, `covers only ${percent(worst.covered)} of ${worst.name}`],
    [widthRatio > limits.width, `is ${widthRatio.toFixed(2)} times as wide as the errors`],
    [withoutU > limits.withoutU, `has no U in ${percent(withoutU)}`],
    [(clean?.withoutU ?? 0) > 0, `has no U in ${percent(clean?.withoutU ?? 0)} of the clean trials`],
    [missing > limits.withoutU, `is missing in ${percent(missing)}`],
    [(clean?.missing ?? 0) > 0, `is missing in ${percent(clean?.missing ?? 0)} of the clean trials`],
    [
      metric === 'takeoffVelocity' && Math.abs(bias) >= limits.velocityBias,
      `is biased by ${bias.toPrecision(2)} m/s`,
    ],
  ]
  return checks.filter(([isBroken]) => isBroken).map(([, words]) => `${metric} ${words}`)
}
