import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { isMissing, type Missing } from '../missing.ts'
import { typicalError, typicalErrorOfTwo, typicalErrorPercent, type TypicalError } from './typical-error.ts'

fc.configureGlobal({ seed: 7 })

function expectFound(result: TypicalError | Missing): TypicalError {
  if (isMissing(result)) throw new Error(`Missing: ${result.missing}`)
  return result
}

const pairs = fc.array(
  fc.tuple(fc.double({ min: 1, max: 100, noNaN: true }), fc.double({ min: 1, max: 100, noNaN: true })),
  { minLength: 2, maxLength: 15 },
)

describe('the typical error', () => {
  it('of k trials is that of two where there are two', () => {
    fc.assert(
      fc.property(pairs, (rows) => {
        const ofTable = expectFound(typicalError(rows))
        const ofTwo = expectFound(
          typicalErrorOfTwo(
            rows.map(([first]) => first),
            rows.map(([, second]) => second),
          ),
        )
        return ofTable.dof === ofTwo.dof && Math.abs(ofTable.value - ofTwo.value) < 1e-9 * (1 + ofTwo.value)
      }),
    )
  })

  it('does not count a shift common to all, nor which trial came first', () => {
    const first = [40.1, 35.2, 52.7, 44]
    const second = [41, 34.8, 53.9, 44.2]
    const shifted = second.map((value) => value + 3)
    const typical = expectFound(typicalErrorOfTwo(first, second)).value
    expect(expectFound(typicalErrorOfTwo(first, shifted)).value).toBeCloseTo(typical, 12)
    expect(expectFound(typicalErrorOfTwo(second, first)).value).toBeCloseTo(typical, 14)
  })

  it('scales with the unit, its interval too', () => {
    const rows = [
      [1, 2, 2],
      [4, 3, 5],
      [7, 9, 8],
    ]
    const [cm, mm] = [rows, rows.map((row) => row.map((value) => 10 * value))].map((r) =>
      expectFound(typicalError(r)),
    )
    for (const key of ['value', 'low', 'high'] as const) expect(mm[key]).toBeCloseTo(10 * cm[key], 10)
    expect(cm.dof).toBe(4)
    expect(cm.low).toBeLessThan(cm.value)
    expect(cm.high).toBeGreaterThan(cm.value)
  })

  it('is wider in its interval the fewer the measurements', () => {
    const ratio = (n: number) => {
      const rows = Array.from({ length: n }, (_, i) => [i, i + (i % 2)])
      const { low, high } = expectFound(typicalError(rows))
      return high / low
    }
    expect(ratio(4)).toBeGreaterThan(ratio(10))
    expect(ratio(10)).toBeGreaterThan(ratio(50))
  })

  it('is zero, and sure of it, where trials repeat to the digit', () => {
    expect(
      typicalError([
        [1, 1],
        [2, 2],
        [9, 9],
      ]),
    ).toEqual({ value: 0, low: 0, high: 0, dof: 2 })
  })

  it('gives a reason where it cannot be told', () => {
    expect(typicalErrorOfTwo([], [])).toEqual({ missing: 'too-few-values', found: 0, needed: 2 })
    expect(typicalErrorOfTwo([1], [2])).toEqual({ missing: 'too-few-values', found: 1, needed: 2 })
    expect(typicalErrorOfTwo([1, 2], [1])).toEqual({ missing: 'unequal-lengths' })
    expect(typicalErrorOfTwo([1, 2], [1, NaN])).toEqual({ missing: 'not-finite' })
    expect(typicalError([[1, 2]])).toMatchObject({ missing: 'too-few-values' })
  })

  it('holds for huge values', () => {
    const huge = expectFound(typicalErrorOfTwo([1e300, 2e300, 3e300], [1e300, 2.5e300, 3e300]))
    const small = expectFound(typicalErrorOfTwo([1, 2, 3], [1, 2.5, 3]))
    expect(huge.high / 1e300).toBeCloseTo(small.high, 12)
  })
})

describe('the typical error as a coefficient of variation', () => {
  it('does not mind a unit, and of small errors is their share of the value', () => {
    const rows = [
      [100, 101],
      [200, 198],
      [300, 301],
    ]
    const percent = expectFound(typicalErrorPercent(rows))
    const other = expectFound(typicalErrorPercent(rows.map((row) => row.map((value) => 0.01 * value))))
    expect(other.value).toBeCloseTo(percent.value, 10)
    const logs = rows.map(([a, b]) => Math.log(b / a))
    const centre = (logs[0] + logs[1] + logs[2]) / 3
    const sd = Math.sqrt(logs.reduce((sum, log) => sum + (log - centre) ** 2, 0) / 2)
    expect(percent.value).toBeCloseTo(100 * (Math.exp(sd / Math.SQRT2) - 1), 10)
  })

  it('asks for values above zero', () => {
    expect(
      typicalErrorPercent([
        [1, 2],
        [0, 1],
      ]),
    ).toEqual({ missing: 'not-positive' })
    expect(
      typicalErrorPercent([
        [1, 2],
        [-3, -4],
      ]),
    ).toEqual({ missing: 'not-positive' })
    expect(
      typicalErrorPercent([
        [1, 2],
        [NaN, 1],
      ]),
    ).toEqual({ missing: 'not-finite' })
    expect(typicalErrorPercent([])).toMatchObject({ missing: 'too-few-values' })
  })
})
