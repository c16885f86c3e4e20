import { describe, expect, it } from 'vitest'
import { defaultSettings } from '../settings.ts'
import { runningSums } from '../signal/running-mean.ts'
import { comesToStay, findStill } from './still.ts'

const weight = 800
/** Published check: F = W(1 + A·e^(−t/τ)) comes within 5 % for good at τ·ln(A/0.05). */
const decay = (amplitude: number, tauS: number) =>
  Float64Array.from({ length: 4000 }, (_, i) => weight * (1 + amplitude * Math.exp(-i / 1000 / tauS)))

describe('comesToStay', () => {
  it.each([
    [2, 0.25, 0.9222199],
    [1.5, 0.3, 1.0203591],
  ])(
    'finds where an exponential of amplitude %f and time constant %f s stays within 5 %',
    (amplitude, tau, seconds) => {
      const sums = runningSums(decay(amplitude, tau), 'test')
      expect((comesToStay(sums, weight, 0.05 * weight, 0, 1000, 0) ?? NaN) / 1000).toBeCloseTo(seconds, 4)
    },
  )

  it('starts anew when force leaves the band again', () => {
    const force = decay(2, 0.1)
    for (let i = 1000; i < 1100; i++) force[i] = 900
    expect(comesToStay(runningSums(force, 'test'), weight, 40, 0, 1000, 0)).toBeCloseTo(1099.6, 1)
  })

  it('says null where the record ends before', () => {
    expect(comesToStay(runningSums(decay(2, 0.25), 'test'), weight, 40, 0, 3500, 0)).toBeNull()
    expect(comesToStay(runningSums(new Float64Array(0), 'test'), weight, 40, 0, 10, 0)).toBeNull()
    expect(
      comesToStay(runningSums(new Float64Array(3000).fill(NaN), 'test'), weight, 40, 0, 10, 0),
    ).toBeNull()
  })
})

describe('findStill', () => {
  it('lies 30 ms after force has come back into the band for good', () => {
    const force = Float64Array.from({ length: 4000 }, (_, i) => (i < 1500 ? 1000 : weight))
    const still = findStill(runningSums(force, 'test'), weight, 100, 0.001, defaultSettings)
    expect(Math.abs((still ?? NaN) - 1540)).toBeLessThan(12)
  })
})
