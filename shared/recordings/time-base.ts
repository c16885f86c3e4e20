import { ReadFault } from './errors.ts'
import { MAX_FILLED_SHARE, MAX_GAP_S } from './limits.ts'

/** Where each row of a file lies on an even time base. */
export interface TimeBase {
  sampleRateHz: number
  /** Greatest distance of a stamp from the even base, in sample intervals. */
  error: number
  /** Samples from first to last, those of gaps included. */
  length: number
  /** Sample of each row; null where row and sample are the same. */
  sampleOfRow: Int32Array | null
  /** The step the stamps are rounded to in seconds where it is longer than a sample interval, else null. */
  coarseStepS: number | null
}

/** A step further than this from the median step, as a fraction of it, is no even step. Ours. */
const MAX_STEP_ERROR = 0.3
/** Stamps further than this from the even base, in samples, are more than jitter. Ours. */
const MAX_JITTER = 0.75

/** Where a row of numbers stands in its file, for errors. */
export type LineOfRow = (row: number) => number

function smallestStep(stampsS: Float64Array): number {
  let smallest = Infinity
  for (let i = 1; i < stampsS.length; i++) {
    const step = Math.abs((stampsS[i] ?? 0) - (stampsS[i - 1] ?? 0))
    // Below a nanosecond it is the rounding of the numbers themselves.
    if (step > 1e-9 && step < smallest) smallest = step
  }
  return smallest
}

/** Greatest distance of the stamps from an even base through the first and the last, in intervals. */
function distanceFromEven(stampsS: Float64Array, stepS: number, sampleOfRow: Int32Array | null): number {
  const first = stampsS[0] ?? 0
  let greatest = 0
  for (let i = 0; i < stampsS.length; i++) {
    const sample = sampleOfRow ? (sampleOfRow[i] ?? 0) : i
    const distance = Math.abs((stampsS[i] ?? 0) - first - sample * stepS)
    if (distance > greatest) greatest = distance
  }
  return greatest / stepS
}

/** A whole number of hertz where the stamps cannot tell the rate from it. */
function settledRate(stepS: number, intervals: number, error: number): number {
  const rate = 1 / stepS
  const whole = Math.round(rate)
  const tolerance = Math.max(1e-6, (2 * error) / intervals)
  return Math.abs(rate - whole) <= tolerance * rate ? whole : rate
}

function stepsOf(stampsS: Float64Array): Float64Array {
  const steps = new Float64Array(stampsS.length - 1)
  for (let i = 0; i < steps.length; i++) steps[i] = (stampsS[i + 1] ?? 0) - (stampsS[i] ?? 0)
  return steps
}

/** The median step, and the share of steps that are not it. */
function judgeSteps(steps: Float64Array): { median: number; oddShare: number } {
  const median = steps.slice().sort()[steps.length >> 1] ?? 0
  const odd = steps.reduce(
    (count, step) => count + (Math.abs(step - median) > MAX_STEP_ERROR * median ? 1 : 0),
    0,
  )
  return { median, oddShare: median > 0 ? odd / steps.length : 1 }
}

function uneven(row: number, stampsS: Float64Array, lineOf: LineOfRow): ReadFault {
  const [before, after] = [stampsS[row - 1] ?? 0, stampsS[row] ?? 0]
  const line = lineOf(row)
  const from = `${Number(before.toFixed(6))} s`
  const seen = `${Number(after.toFixed(6))} s`
  const sentence =
    after > before
      ? `The time stamps jump from ${from} to ${seen} in line ${line}, which is too much to bridge.`
      : `The time stamps do not go on in line ${line}: ${seen} follows ${from}.`
  return new ReadFault('uneven-time', sentence, { line, seen })
}

/** Places rows with missing samples between them. */
function bridgeGaps(stampsS: Float64Array, step: number, lineOf: LineOfRow): Int32Array {
  const samples = new Int32Array(stampsS.length)
  for (let i = 1; i < stampsS.length; i++) {
    const intervals = ((stampsS[i] ?? 0) - (stampsS[i - 1] ?? 0)) / step
    const whole = Math.max(1, Math.round(intervals))
    const bridged = intervals > MAX_STEP_ERROR && (whole - 1) * step <= MAX_GAP_S
    if (!bridged) throw uneven(i, stampsS, lineOf)
    samples[i] = (samples[i - 1] ?? 0) + whole
  }
  const length = (samples[samples.length - 1] ?? 0) + 1
  const missing = length - stampsS.length
  if (missing > MAX_FILLED_SHARE * length) {
    throw new ReadFault('uneven-time', `${missing} of ${length} samples are missing between the time stamps.`)
  }
  return samples
}

/** The even base of rows that bear no stamps. */
export function evenTimeBase(sampleRateHz: number, length: number): TimeBase {
  return { sampleRateHz, error: 0, length, sampleOfRow: null, coarseStepS: null }
}

/** No step is further than this from the mean one: none is then odd against the median, which lies among them. */
const PLAINLY_EVEN = 0.13

/** The base of stamps that are plainly even, in one pass; null for all others. */
function plainlyEven(stampsS: Float64Array, evenStep: number): TimeBase | null {
  const rows = stampsS.length
  const first = stampsS[0] ?? NaN
  let [before, greatestOdd, greatestError] = [first, 0, 0]
  for (let i = 1; i < rows; i++) {
    const stamp = stampsS[i] as number
    const odd = Math.abs(stamp - before - evenStep)
    if (odd > greatestOdd) greatestOdd = odd
    const error = Math.abs(stamp - first - i * evenStep)
    if (error > greatestError) greatestError = error
    before = stamp
  }
  if (!(greatestOdd <= PLAINLY_EVEN * evenStep)) return null
  const error = greatestError / evenStep
  return evenTimeBaseWith(evenStep, rows, error)
}

function evenTimeBaseWith(stepS: number, rows: number, error: number): TimeBase {
  return { ...evenTimeBase(settledRate(stepS, rows - 1, error), rows), error }
}

/**
 * The even time base of a column of time stamps in seconds (no blanks, at least two). The rate comes from the
 * whole length, which rounding of the stamps hardly touches. A few odd steps are missing samples; many of them,
 * with no stamp far from its place, are rounding or jitter.
 * @throws ReadFault `uneven-time` where stamps go backwards, stand still or jump too far
 */
export function timeBaseOf(stampsS: Float64Array, lineOf: LineOfRow): TimeBase {
  const rows = stampsS.length
  const span = (stampsS[rows - 1] ?? 0) - (stampsS[0] ?? 0)
  if (!(span > 0)) throw uneven(rows - 1, stampsS, lineOf)
  const evenStep = span / (rows - 1)
  const plain = plainlyEven(stampsS, evenStep)
  if (plain) return plain
  const { median, oddShare } = judgeSteps(stepsOf(stampsS))
  const evenError = distanceFromEven(stampsS, evenStep, null)
  const resolution = smallestStep(stampsS)
  const allowed = Math.max(MAX_JITTER, (1.1 * resolution) / evenStep)
  if (oddShare === 0 || (oddShare > MAX_FILLED_SHARE && evenError <= allowed)) {
    return {
      sampleRateHz: settledRate(evenStep, rows - 1, evenError),
      error: evenError,
      length: rows,
      sampleOfRow: null,
      coarseStepS: resolution > 1.05 * evenStep ? resolution : null,
    }
  }
  const sampleOfRow = bridgeGaps(stampsS, median, lineOf)
  const length = (sampleOfRow[rows - 1] ?? 0) + 1
  const step = span / (length - 1)
  const error = distanceFromEven(stampsS, step, sampleOfRow)
  if (error > MAX_JITTER) throw new ReadFault('uneven-time', 'The time stamps lie on no even time base.')
  return { sampleRateHz: settledRate(step, length - 1, error), error, length, sampleOfRow, coarseStepS: null }
}
