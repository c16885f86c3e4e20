import { describe, expect, it } from 'vitest'
import { whiteNoise } from '../../../tests/setup/white-noise.ts'
import { standardGravity } from '../../units/gravity.ts'
import { defaultSettings, type Settings } from '../settings.ts'
import { runningSums } from '../signal/running-mean.ts'
import { findOnset } from './onset.ts'
import { weigh } from './weighing.ts'

const dt = 0.001
const weight = 800
const plate = { mean: 0, sd: 0.5, correlation: Float64Array.of(1), inflation: 1, samples: 400 }

/** Stance of two seconds, then a sin² dip and push; `before` adds to the stance. */
function movement(before: (i: number) => number = () => 0, sd = 0): Float64Array {
  const noise = whiteNoise(61)
  return Float64Array.from({ length: 2800 }, (_, i) => {
    const dip = i > 2000 && i <= 2400 ? -450 * Math.sin((Math.PI * (i - 2000)) / 400) ** 2 : 0
    const push = i > 2400 ? 1500 * Math.sin((Math.PI * (i - 2400)) / 400) ** 2 : 0
    return weight + dip + push + (i < 2000 ? before(i) : 0) + sd * noise()
  })
}
/** sin²(πu/400)·450 = 20 N. */
const crossing = 2000 + (400 / Math.PI) * Math.asin(Math.sqrt(20 / 450))

function onsetIn(force: Float64Array, settings: Settings = defaultSettings) {
  const sums = runningSums(force, 'test')
  const weighing = weigh(force, sums, { from: 0, to: 2799 }, standardGravity, plate, dt, settings)
  if (!weighing) throw new Error('not weighed')
  return findOnset(force, sums, weighing, { earliest: 0, takeoff: 2799 }, plate, dt, settings)
}

describe('findOnset', () => {
  it('lies 30 ms before force leaves 2.5 % of the weight', () => {
    const onset = onsetIn(movement())
    expect(onset.crossing).toBeCloseTo(crossing, 0)
    expect(onset.position).toBeCloseTo(onset.crossing - 30, 9)
    expect(onset.fromQuiet).toBe(true)
    expect(onset.slope).toBeLessThan(0)
  })

  it('is not drawn away by a fidget from which the athlete came back to rest', () => {
    const fidget = (i: number) =>
      i > 1200 && i < 1500 ? 120 * Math.sin((2 * Math.PI * (i - 1200)) / 300) : 0
    expect(onsetIn(movement(fidget)).crossing).toBeCloseTo(crossing, 0)
  })

  it('takes in a rise that runs into the dip', () => {
    const rise = (i: number) => (i > 1900 ? 60 * Math.sin((Math.PI * (i - 1900)) / 100) ** 2 : 0)
    const onset = onsetIn(movement(rise))
    expect(onset.slope).toBeGreaterThan(0)
    expect(onset.crossing).toBeCloseTo(1900 + (100 / Math.PI) * Math.asin(Math.sqrt(20 / 60)), 0)
  })

  it('finds the same place in noise, within what it says of its uncertainty', () => {
    const onset = onsetIn(movement(undefined, 3))
    expect(Math.abs(onset.crossing - crossing)).toBeLessThan(4)
  })

  it('follows the rule of standard deviations where the settings ask for it', () => {
    const force = movement(undefined, 1)
    const onset = onsetIn(force, { ...defaultSettings, onsetRule: 'standard-deviations' })
    // Five standard deviations of 1 N lie nearer to the weight than 2.5 %.
    expect(onset.crossing).toBeLessThan(crossing - 8)
  })

  it('says when there was no quiet stance before the movement', () => {
    const restless = (i: number) => 60 * Math.sin(i / 25)
    expect(onsetIn(movement(restless)).fromQuiet).toBe(false)
  })
})
