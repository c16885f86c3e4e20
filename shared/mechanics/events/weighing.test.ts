import { describe, expect, it } from 'vitest'
import { whiteNoise } from '../../../tests/setup/white-noise.ts'
import { standardGravity } from '../../units/gravity.ts'
import { defaultSettings } from '../settings.ts'
import { runningSums } from '../signal/running-mean.ts'
import { weigh } from './weighing.ts'

const dt = 0.001
const plate = { mean: 0, sd: 3, correlation: Float64Array.of(1), inflation: 1, samples: 400 }
const weighed = (force: Float64Array, to = force.length) =>
  weigh(force, runningSums(force, 'test'), { from: 0, to }, standardGravity, plate, dt, defaultSettings)
const stance = (samples: number, sd: number, seed = 51) => {
  const noise = whiteNoise(seed)
  return Float64Array.from({ length: samples }, () => 800 + sd * noise())
}

describe('weigh', () => {
  it('takes the mean of the steadiest second', () => {
    const force = stance(4000, 1)
    for (let i = 0; i < 1500; i++) force[i] += 40 * Math.sin(i / 30)
    const found = weighed(force)
    expect(found?.window.from).toBeGreaterThanOrEqual(1500)
    expect((found?.window.to ?? 0) - (found?.window.from ?? 0)).toBe(1000)
    expect(found?.systemWeight).toBeCloseTo(800, 0)
  })

  it('knows its standard error: that of the mean of as many independent samples', () => {
    let square = 0
    let u = 0
    for (let seed = 1; seed <= 200; seed++) {
      const found = weighed(stance(2000, 3, seed))
      square += ((found?.systemWeight ?? NaN) - 800) ** 2 / 200
      u += (found?.noiseU ?? NaN) / 200
    }
    expect(Math.sqrt(square) / u).toBeGreaterThan(0.75)
    expect(Math.sqrt(square) / u).toBeLessThan(1.15)
  })

  it('takes a shorter stance where there is no steady second, and none under a quarter', () => {
    const short = stance(600, 1)
    const withDip = Float64Array.from({ length: 1500 }, (_, i) =>
      i < 600 ? short[i] : 800 - 400 * Math.sin((i - 600) / 300),
    )
    const found = weighed(withDip)
    expect((found?.window.to ?? 0) - (found?.window.from ?? 0)).toBeLessThanOrEqual(750)
    expect(found?.systemWeight).toBeCloseTo(800, -1)
    expect(weighed(stance(200, 1))).toBeNull()
    expect(weighed(stance(200, 1), 0)).toBeNull()
  })

  it('adds what sway would add where the stance shows less, and estimates it from a long stance', () => {
    const mass = 800 / standardGravity
    expect(weighed(stance(2000, 0))?.swayU).toBeCloseTo(defaultSettings.swayVelocityChange * mass, 3)
    const long = stance(9000, 0.5)
    for (let i = 0; i < long.length; i++) long[i] += 2 * Math.sin((2 * Math.PI * i) / 4300)
    const found = weighed(long)
    expect(found?.swayDof).toBeLessThan(10)
    expect(Math.hypot(found?.swayU ?? 0, found?.noiseU ?? 0)).toBeGreaterThan(0.6)
  })

  it('scales with the unit of force', () => {
    const plain = weighed(stance(2000, 3))
    const scaled = weighed(stance(2000, 3).map((newton) => 1000 * newton))
    expect((scaled?.noiseU ?? NaN) / (plain?.noiseU ?? NaN)).toBeCloseTo(1000, 3)
  })
})
