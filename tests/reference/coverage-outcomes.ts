import type { SyntheticProtocol } from '../../seed/synthetic/attempts.ts'
import { truthOf } from '../../seed/synthetic/truth.ts'
import { analyse } from '../../shared/mechanics/analyse.ts'
import type { TrialAnalysis } from '../../shared/mechanics/types.ts'
import { CALIBRATION_U } from './coverage-draws.ts'
import { coverageTrial, laboratoryTrial } from './coverage-trials.ts'
import type { CoverageTrial } from './coverage-trials.ts'
import { findsSeveral, testOf } from './engine-protocols.ts'

const jump = ['bodyWeight', 'takeoffVelocity', 'jumpHeightImpulse', 'netImpulse'] as const
const landing = ['landingPeakForce', 'landingLoadingRate2080'] as const
const drop = ['dropVelocity', 'effectiveDropHeight'] as const

/** Figures whose uncertainty is put to the proof. */
export const coveredMetrics: Record<SyntheticProtocol, readonly string[]> = {
  cmj: [...jump, 'timeToTakeoff', ...landing],
  sj: [...jump, 'timeToTakeoff', ...landing],
  slcmj: [...jump, 'timeToTakeoff', ...landing],
  dj: [...jump, ...landing, 'contactTime', 'rsi', ...drop],
  dropLanding: ['bodyWeight', 'landingTime', ...landing, ...drop],
  hops: ['bodyWeight', 'contactTimeMean', 'rsiBestFive'],
}

/** What the engine said of one figure of one trial, against the truth. */
export interface Outcome {
  metric: string
  strata: Record<string, string>
  /** null where the engine gave no figure */
  error: number | null
  /** null where the figure came without uncertainty */
  U: number | null
}

/** A range of trial numbers of one protocol, or of jumps in the laboratory. */
export interface Lot {
  of: SyntheticProtocol | 'laboratory'
  from: number
  to: number
}

/** The plates are loaded for certain so long after the feet strike them, s. */
const STRUCK_S = 0.05

/** The engine's trial in which this one's feet strike last. */
function analysed({ trial, recording, startS }: CoverageTrial): TrialAnalysis | undefined {
  const calibrationU = Object.fromEntries(
    Object.keys(recording.channels).map((channel) => [channel, CALIBRATION_U]),
  )
  const { gravity } = trial.athlete
  const { trials } = analyse(recording, { test: testOf(trial), gravity, calibrationU })
  const struckS = (trial.marks.flights.at(-1)?.toS ?? trial.marks.arrivalS ?? NaN) - startS + STRUCK_S
  return trials.find((found) => found.startS <= struckS && struckS <= found.endS)
}

function outcomesOf(drawn: CoverageTrial, metrics: readonly string[]): Outcome[] {
  const truths = truthOf(drawn.trial).metrics
  const figures = analysed(drawn)?.metrics ?? {}
  return metrics.map((metric): Outcome => {
    const [truth, figure] = [truths[metric], figures[metric]]
    if (truth === undefined) throw new RangeError(`A synthetic trial has no true ${metric}.`)
    return {
      metric,
      strata: drawn.strata,
      error: figure ? figure.value - truth : null,
      U: figure?.U ?? null,
    }
  })
}

/** The engine against the truth, trial by trial and figure by figure. */
export function measureLot({ of, from, to }: Lot): Outcome[] {
  const numbers = Array.from({ length: to - from }, (_, i) => from + i)
  if (of === 'laboratory')
    return numbers.flatMap((number) => outcomesOf(laboratoryTrial(number), ['takeoffVelocity']))
  const mayBeAccompanied = findsSeveral(of)
  return numbers.flatMap((number) =>
    outcomesOf(coverageTrial(of, number, mayBeAccompanied), coveredMetrics[of]),
  )
}
