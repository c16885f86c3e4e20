import { describe, expect, it } from 'vitest'
import { chiSquaredQuantile } from '../../../shared/statistics/distributions/chi-squared-quantile.ts'
import { normalQuantile } from '../../../shared/statistics/distributions/normal-quantile.ts'
import { tQuantile } from '../../../shared/statistics/distributions/t-quantile.ts'

// Critical values as the tables of NIST/SEMATECH e-Handbook 1.3.6.7 print them (t and normal to 3 digits, χ² to 3),
// with further digits by SciPy 1.17.

describe('the tables of critical values', () => {
  it.each([
    [0.9, 1.281552],
    [0.95, 1.644854],
    [0.975, 1.959964],
    [0.99, 2.326348],
    [0.995, 2.575829],
  ])('normal at %f', (p, value) => {
    expect(normalQuantile(p)).toBeCloseTo(value, 6)
  })

  const shares = [0.9, 0.95, 0.975, 0.99, 0.995]
  it.each([
    [1, [3.0777, 6.3138, 12.7062, 31.8205, 63.6567]],
    [2, [1.8856, 2.92, 4.3027, 6.9646, 9.9248]],
    [3, [1.6377, 2.3534, 3.1824, 4.5407, 5.8409]],
    [4, [1.5332, 2.1318, 2.7764, 3.7469, 4.6041]],
    [5, [1.4759, 2.015, 2.5706, 3.3649, 4.0321]],
    [7, [1.4149, 1.8946, 2.3646, 2.998, 3.4995]],
    [9, [1.383, 1.8331, 2.2622, 2.8214, 3.2498]],
    [10, [1.3722, 1.8125, 2.2281, 2.7638, 3.1693]],
    [15, [1.3406, 1.7531, 2.1314, 2.6025, 2.9467]],
    [20, [1.3253, 1.7247, 2.086, 2.528, 2.8453]],
    [30, [1.3104, 1.6973, 2.0423, 2.4573, 2.75]],
    [60, [1.2958, 1.6706, 2.0003, 2.3901, 2.6603]],
    [120, [1.2886, 1.6577, 1.9799, 2.3578, 2.6174]],
  ])('Student’s t at %i degrees of freedom', (dof, values) => {
    shares.forEach((p, i) => expect(Math.abs(tQuantile(p, dof) - values[i])).toBeLessThan(5.01e-5))
  })

  it.each([
    [5, 0.83121, 12.8325],
    [7, 1.68987, 16.01276],
    [9, 2.70039, 19.02277],
    [10, 3.24697, 20.48318],
    [14, 5.62873, 26.11895],
    [19, 8.90652, 32.85233],
    [29, 16.04707, 45.72229],
  ])('χ² at %i degrees of freedom', (dof, low, high) => {
    expect(chiSquaredQuantile(0.025, dof)).toBeCloseTo(low, 5)
    expect(chiSquaredQuantile(0.975, dof)).toBeCloseTo(high, 4)
  })
})
