import { tooFew, type Missing } from '../missing.ts'

export interface EwmaOptions {
  /** Where the process should be, and the standard deviation of a value about it. */
  target: number
  sd: number
  /** λ, the weight of the newest value, above 0 to 1. NIST/SEMATECH: 0.2 to 0.3. */
  weight?: number
  /** Half-width of the limits in standard deviations of the average. 2.7 warns earlier (common practice). */
  width?: number
  /** `exact` limits open up from the first value; `steady` ones are those of a long series. */
  limits?: 'exact' | 'steady'
}

export interface EwmaPoint {
  value: number
  ewma: number
  low: number
  high: number
  outside: boolean
}

/**
 * Exponentially weighted moving average z_t = λ·x_t + (1 − λ)·z_(t−1) from z_0 = target, with control limits
 * target ± L·s·√(λ/(2 − λ)·(1 − (1 − λ)^(2t))), the last factor in `exact` limits only
 * (NIST/SEMATECH e-Handbook of Statistical Methods, 6.3.2.4; Lucas, Saccucci 1990, Technometrics 32:1–12).
 */
export function ewmaChart(
  values: readonly number[],
  { target, sd, weight = 0.2, width = 3, limits = 'exact' }: EwmaOptions,
): EwmaPoint[] | Missing {
  if (!(weight > 0 && weight <= 1))
    throw new RangeError(`The weight lies above 0 and to 1, this is ${weight}.`)
  if (values.length === 0) return tooFew(0, 1)
  if (![...values, target, sd].every(Number.isFinite)) return { missing: 'not-finite' }
  if (!(sd > 0)) return { missing: 'no-spread' }
  const steady = width * sd * Math.sqrt(weight / (2 - weight))
  let ewma = target
  return values.map((value, i) => {
    ewma += weight * (value - ewma)
    const half = limits === 'steady' ? steady : steady * Math.sqrt(1 - (1 - weight) ** (2 * (i + 1)))
    return { value, ewma, low: target - half, high: target + half, outside: Math.abs(ewma - target) > half }
  })
}
