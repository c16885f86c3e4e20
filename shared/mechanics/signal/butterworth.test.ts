import { describe, expect, it } from 'vitest'
import { lowPass, zeroLagLowPass } from './butterworth.ts'

describe('lowPass', () => {
  // Second-order Butterworth, cut-off corrected for two passes; evaluated with NumPy from Winter's equations.
  const table: [rate: number, cutoff: number, b0: number, a1: number, a2: number][] = [
    [1000, 10, 0.00145186336625, -1.88936292049, 0.895170373953],
    [1000, 50, 0.0295690747162, -1.45810386046, 0.576380159326],
    [1000, 100, 0.0944467438849, -0.962641308844, 0.340428284384],
    [500, 50, 0.0944467438849, -0.962641308844, 0.340428284384],
    [100, 6, 0.0405946814474, -1.3547488152, 0.517127540989],
  ]
  it.each(table)(
    'at %i Hz and a cut-off of %f Hz has the published coefficients',
    (rate, cutoff, b0, a1, a2) => {
      const section = lowPass(cutoff, rate)
      expect(section.b0).toBeCloseTo(b0, 10)
      expect(section.b1).toBeCloseTo(2 * b0, 10)
      expect(section.a1).toBeCloseTo(a1, 9)
      expect(section.a2).toBeCloseTo(a2, 9)
    },
  )
})

describe('zeroLagLowPass', () => {
  const sine = (hz: number) =>
    Float64Array.from({ length: 4000 }, (_, i) => Math.sin((2 * Math.PI * hz * i) / 1000))
  const section = lowPass(50, 1000)

  it('leaves 0.7071 of a sine at the cut-off and does not shift it', () => {
    const filtered = zeroLagLowPass(sine(50), 0, 4000, section)
    const original = sine(50)
    let product = 0
    let power = 0
    for (let i = 500; i < 3500; i++) {
      product += filtered[i] * original[i]
      power += original[i] * original[i]
    }
    expect(product / power).toBeCloseTo(Math.SQRT1_2, 4)
  })

  it('passes constants and, up to the ends, straight lines unchanged', () => {
    const line = Float64Array.from({ length: 300 }, (_, i) => 800 + 2 * i)
    zeroLagLowPass(line, 0, 300, section).forEach((value, i) => expect(value).toBeCloseTo(line[i], 1))
    zeroLagLowPass(new Float64Array(40).fill(3), 0, 40, section).forEach((value) =>
      expect(value).toBeCloseTo(3, 9),
    )
  })

  it('gives back the stretch only and leaves the record as it was', () => {
    const record = sine(5)
    const before = record.slice()
    expect(zeroLagLowPass(record, 100, 160, section)).toHaveLength(60)
    expect(record).toEqual(before)
    expect(zeroLagLowPass(record, 100, 101, section)[0]).toBeCloseTo(record[100], 9)
    expect(zeroLagLowPass(record, 100, 100, section)).toHaveLength(0)
  })
})
