import { describe, expect, it } from 'vitest'
import { mean } from '../../../shared/statistics/summary/mean.ts'
import { standardDeviation } from '../../../shared/statistics/summary/standard-deviation.ts'
import { numericalAccuracy, observed } from './nist-univariate-data.ts'

/** Relative difference from the certified value. */
const off = (value: number | null, certified: number) => Math.abs((value ?? NaN) / certified - 1)

describe('NIST’s reference data of one variable', () => {
  it.each(numericalAccuracy)('$name: mean to 15, standard deviation to $digits digits', (dataset) => {
    expect(off(mean(dataset.values), dataset.mean)).toBeLessThan(1e-15)
    expect(off(standardDeviation(dataset.values), dataset.sd)).toBeLessThan(10 ** -dataset.digits)
  })

  it('NumAcc3 and 4: the standard deviation of the values as they are stored, to the last digits', () => {
    // Exact two-pass results on the nearest doubles, by NumPy 2.4.
    expect(standardDeviation(numericalAccuracy[2].values)).toBeCloseTo(0.10000000003492, 13)
    expect(standardDeviation(numericalAccuracy[3].values)).toBeCloseTo(0.10000000055879, 13)
  })

  it.each(observed)('$name: mean and standard deviation to 12 digits', (dataset) => {
    expect(off(mean(dataset.values), dataset.mean)).toBeLessThan(1e-14)
    expect(off(standardDeviation(dataset.values), dataset.sd)).toBeLessThan(1e-12)
  })
})
