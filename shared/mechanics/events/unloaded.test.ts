import { describe, expect, it } from 'vitest'
import { whiteNoise } from '../../../tests/setup/white-noise.ts'
import { defaultSettings } from '../settings.ts'
import { runningSums } from '../signal/running-mean.ts'
import { findUnloaded } from './unloaded.ts'

const dt = 0.001
const find = (force: Float64Array) => findUnloaded(force, runningSums(force, 'test'), dt, defaultSettings)
/** Force by stretches of [newtons, samples], with noise. */
function trace(...stretches: [newton: number, samples: number][]): Float64Array {
  const noise = whiteNoise(41)
  return Float64Array.from(
    stretches.flatMap(([newton, count]) => Array.from({ length: count }, () => newton + 2 * noise())),
  )
}

describe('findUnloaded', () => {
  it('finds a flight between two loaded stretches, with level and noise of the empty plates', () => {
    const found = find(trace([800, 2000], [-4, 500], [800, 2000]))
    expect(found?.flights).toEqual([{ from: 2000, to: 2500 }])
    expect(Math.abs((found?.level ?? NaN) + 4)).toBeLessThan(1)
    expect(found?.sd).toBeGreaterThan(1.4)
    expect(found?.stanceLevel).toBeCloseTo(800, -1)
  })

  it('takes more than 1.2 s, or an end of the record, for being off the plates', () => {
    const found = find(trace([0, 300], [800, 2000], [0, 1300], [800, 1000], [0, 50]))
    expect(found?.flights).toEqual([])
    expect(found?.offPlate).toHaveLength(3)
  })

  it('passes over a spell of ringing within a flight, and over a dip too short to be one', () => {
    const found = find(trace([800, 2000], [0, 200], [60, 8], [0, 300], [800, 900], [0, 60], [800, 900]))
    expect(found?.flights).toEqual([{ from: 2000, to: 2508 }])
  })

  it('takes slow noise of empty plates for no foot', () => {
    const slow = trace([0, 1500], [800, 300], [0, 450], [800, 2000]).map((newton, i) =>
      newton < 400 ? newton + 9 * Math.sin(i / 120) : newton,
    )
    const found = find(slow)
    expect(found?.offPlate).toHaveLength(1)
    expect(found?.flights).toHaveLength(1)
  })

  it('still finds the flight when most of the record is empty', () => {
    expect(find(trace([0, 9000], [800, 1500], [0, 400], [800, 1500], [0, 4000]))?.flights).toHaveLength(1)
  })

  it('adapts to noise, to an offset, and to plates tared with the athlete on them', () => {
    expect(
      find(trace([800, 2000], [0, 500], [800, 2000]).map((newton) => newton - 800))?.flights,
    ).toHaveLength(1)
    expect(
      find(trace([800, 2000], [0, 500], [800, 2000]).map((newton) => 15 * newton))?.flights,
    ).toHaveLength(1)
  })

  it.each([
    ['only standing', trace([800, 4000])],
    ['constant force', new Float64Array(4000).fill(800)],
    ['zeros', new Float64Array(4000)],
    [
      'a shallow squat',
      trace([800, 2000]).map((n, i) => n - 400 * Math.sin(Math.PI * Math.min(1, i / 2000)) ** 2),
    ],
    ['next to nothing', new Float64Array(5)],
    ['nothing at all', new Float64Array(0)],
    ['NaN', new Float64Array(1000).fill(NaN)],
  ])('finds no empty plates in %s', (_, force) => {
    expect(find(force)).toBeNull()
  })
})
