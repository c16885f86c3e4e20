import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Estimate } from '../estimate.ts'
import { isMissing, type Missing } from '../missing.ts'
import { intraclassCorrelations, type IntraclassCorrelations } from './intraclass-correlation.ts'

fc.configureGlobal({ seed: 7 })

type Found = Record<keyof IntraclassCorrelations, Estimate>

function expectFound(result: IntraclassCorrelations | Missing): Found {
  if (isMissing(result)) throw new Error(`Missing: ${result.missing}`)
  if (Object.values(result).includes(null)) throw new Error('A form is missing.')
  return result as Found
}

const forms = [
  'oneWaySingle',
  'agreementSingle',
  'consistencySingle',
  'oneWayAverage',
  'agreementAverage',
  'consistencyAverage',
] as const

// The published example stands in tests/reference. Here: how the forms behave.
const scattered = [
  [41.2, 42.0, 40.8],
  [35.5, 36.9, 35.0],
  [52.1, 51.0, 53.4],
  [44.0, 46.1, 44.9],
  [38.7, 38.1, 40.0],
]

describe('the intraclass correlations', () => {
  it.each([
    ['nothing', [], 'too-few-values'],
    ['one subject', [[1, 2, 3]], 'too-few-values'],
    ['one trial', [[1], [2]], 'too-few-values'],
    ['a trial left out', [[1, 2], [3]], 'unequal-lengths'],
    [
      'NaN',
      [
        [1, NaN],
        [3, 4],
      ],
      'not-finite',
    ],
    [
      'values that are all the same',
      [
        [7, 7],
        [7, 7],
        [7, 7],
      ],
      'no-spread',
    ],
  ])('have a reason for %s', (_what, rows, missing) => {
    expect(intraclassCorrelations(rows)).toMatchObject({ missing })
  })

  it('are 1, in every form, where trials repeat to the digit', () => {
    const perfect = expectFound(
      intraclassCorrelations([
        [1, 1],
        [2, 2],
        [5, 5],
      ]),
    )
    for (const form of forms) expect(perfect[form]).toEqual({ value: 1, low: 1, high: 1 })
  })

  it('count a shift between trials in agreement, and not in consistency', () => {
    const shifted = expectFound(
      intraclassCorrelations([
        [1, 4],
        [2, 5],
        [5, 8],
        [9, 12],
      ]),
    )
    expect(shifted.consistencySingle).toEqual({ value: 1, low: 1, high: 1 })
    expect(shifted.agreementSingle.value).toBeLessThan(0.9)
    expect(shifted.oneWaySingle.value).toBeLessThan(0.9)
  })

  it('lie between the limits of their intervals, and below 1', () => {
    const found = expectFound(intraclassCorrelations(scattered))
    for (const form of forms) {
      expect(found[form].low).toBeLessThan(found[form].value)
      expect(found[form].high).toBeGreaterThan(found[form].value)
      expect(found[form].high).toBeLessThan(1)
    }
  })

  it('are higher for the mean of several trials than for one', () => {
    const found = expectFound(intraclassCorrelations(scattered))
    expect(found.oneWayAverage.value).toBeGreaterThan(found.oneWaySingle.value)
    expect(found.agreementAverage.value).toBeGreaterThan(found.agreementSingle.value)
    expect(found.consistencyAverage.value).toBeGreaterThan(found.consistencySingle.value)
  })

  it('have wider intervals for a higher coverage', () => {
    const [at90, at99] = [0.9, 0.99].map((coverage) =>
      expectFound(intraclassCorrelations(scattered, coverage)),
    )
    for (const form of forms) {
      expect(at99[form].low).toBeLessThan(at90[form].low)
      expect(at99[form].high).toBeGreaterThan(at90[form].high)
    }
  })

  it('may be below zero where subjects differ less than chance has it', () => {
    const opposed = intraclassCorrelations([
      [1, 3],
      [3, 1],
      [2, 2.5],
    ])
    if (isMissing(opposed)) throw new Error(opposed.missing)
    expect(opposed.oneWaySingle?.value).toBeLessThan(0)
    expect(opposed.agreementSingle?.value).toBeLessThan(0)
    expect(opposed.consistencySingle?.value).toBeLessThan(0)
    expect(opposed.consistencyAverage?.value).toBeLessThan(opposed.consistencySingle?.value ?? NaN)
  })

  it('have no value where the estimated variances add up to nothing', () => {
    const found = intraclassCorrelations([
      [1, 3],
      [3, 1],
    ])
    expect(found).toMatchObject({ oneWaySingle: { value: -1 }, oneWayAverage: null, agreementSingle: null })
  })

  it('do not mind the unit, a shift of everything, or the order of subjects and trials', () => {
    const scale = fc.double({ min: 0.01, max: 100, noNaN: true })
    fc.assert(
      fc.property(scale, fc.double({ min: -50, max: 50, noNaN: true }), (unit, shift) => {
        const turned = scattered.map((row) => row.map((value) => unit * (value + shift)).reverse()).reverse()
        const [here, there] = [scattered, turned].map((rows) => expectFound(intraclassCorrelations(rows)))
        return forms.every((form) =>
          (['value', 'low', 'high'] as const).every(
            (key) => Math.abs(here[form][key] - there[form][key]) < 1e-8,
          ),
        )
      }),
      { numRuns: 30 },
    )
  })

  it('are numbers for whatever table, small or odd', () => {
    const cell = fc.integer({ min: -3, max: 3 })
    const table = fc.array(fc.array(cell, { minLength: 3, maxLength: 3 }), { minLength: 2, maxLength: 4 })
    fc.assert(
      fc.property(table, (rows) => {
        const result = intraclassCorrelations(rows)
        if (isMissing(result)) return result.missing === 'no-spread'
        return forms.every((form) => {
          const found = result[form]
          return found === null || (found.value <= 1 && found.low <= found.value && found.value <= found.high)
        })
      }),
    )
  })
})
