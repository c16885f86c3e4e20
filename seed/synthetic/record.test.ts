import { describe, expect, it } from 'vitest'
import { makeJump } from './jump.ts'
import type { PlateOptions } from './options.ts'
import { perform } from './perform.ts'
import { recordJump } from './record.ts'
import { seededRandom } from './random.ts'

const quiet = makeJump({ stanceS: 5, takeoffVelocity: 2 })
/** The first four seconds of stance under one plate, less the true force. */
function errorsOf(plate: Partial<PlateOptions>): Float64Array {
  const { single } = recordJump(quiet, { durationS: 4, plates: 1 }, { left: plate }, 3).channels
  return (single ?? new Float64Array(0)).map((force) => force - 75 * 9.80665)
}
const mean = (values: Float64Array): number => values.reduce((sum, value) => sum + value, 0) / values.length
const deviation = (values: Float64Array): number => {
  const middle = mean(values)
  return Math.sqrt(mean(values.map((value) => (value - middle) ** 2)))
}
const lagged = (values: Float64Array, lag: number): number =>
  mean(values.slice(lag).map((value, i) => value * (values[i] ?? 0))) /
  mean(values.map((value) => value ** 2))

describe('recordJump', () => {
  it('samples the true force exactly on a perfect plate', () => {
    const jump = makeJump({
      shares: { stance: 0.52, unweighting: 0.52, braking: 0.5, propulsion: 0.49, landing: 0.55 },
    })
    const { left, right } = recordJump(jump, { sampleRateHz: 500 }).channels
    for (const i of [0, 700, 1100, 1200, 1600, 2900]) {
      expect((left?.[i] ?? NaN) + (right?.[i] ?? NaN)).toBeCloseTo(jump.force(i / 500), 9)
    }
  })

  it('is the same for the same seed and another for another', () => {
    const plates = { left: { whiteNoiseN: 1 }, right: { whiteNoiseN: 1 } }
    const [a, b, c] = [1, 1, 2].map((seed) => recordJump(quiet, {}, plates, seed).channels.left)
    expect(a).toStrictEqual(b)
    expect(a).not.toStrictEqual(c)
  })

  it('adds gain, offset and drift', () => {
    expect(mean(errorsOf({ gainError: 0.01 }))).toBeCloseTo(0.01 * 75 * 9.80665, 6)
    expect(mean(errorsOf({ offsetN: -4 }))).toBeCloseTo(-4, 9)
    expect(errorsOf({ driftNPerS: 0.5 })[2000]).toBeCloseTo(1, 9)
  })

  it('adds white noise of its size without memory', () => {
    const errors = errorsOf({ whiteNoiseN: 2 })
    expect(deviation(errors)).toBeCloseTo(2, 0)
    expect(lagged(errors, 1)).toBeCloseTo(0, 1)
  })

  it('adds slow noise of its size that forgets in its time', () => {
    const errors = errorsOf({ slowNoiseN: 2, slowNoiseTimeS: 0.02 })
    expect(Math.abs(deviation(errors) - 2)).toBeLessThan(0.4)
    expect(lagged(errors, 20)).toBeCloseTo(Math.exp(-1), 0)
    expect(lagged(errors, 1)).toBeGreaterThan(0.9)
  })

  it('rings after touchdown only', () => {
    const jump = makeJump()
    const [rung, clean] = [{ ringingN: 80 }, {}].map(
      (left) => recordJump(jump, { plates: 1 }, { left }).channels.single,
    )
    const touch = Math.ceil((jump.touchesS[0] ?? NaN) * 1000)
    const differences = (rung ?? new Float64Array(0)).map((force, i) => Math.abs(force - (clean?.[i] ?? 0)))
    expect(Math.max(...differences.slice(0, touch))).toBe(0)
    expect(Math.max(...differences.slice(touch, touch + 20))).toBeGreaterThan(40)
    expect(Math.max(...differences.slice(touch + 150))).toBeLessThan(0.01)
  })

  it('rings after every touch, and only under a foot that strikes', () => {
    const hops = perform({}, [{ protocol: 'hops', side: 'left' }])
    const plates = { left: { ringingN: 80 }, right: { ringingN: 80 } }
    const sampling = { durationS: hops.endS }
    const [rung, clean] = [plates, {}].map((each) => recordJump(hops, sampling, each).channels)
    const differences = (rung?.left ?? new Float64Array(0)).map((force, i) =>
      Math.abs(force - (clean?.left?.[i] ?? NaN)),
    )
    const after = (timeS: number): number =>
      Math.max(...differences.slice(Math.ceil(timeS * 1000), Math.ceil(timeS * 1000) + 10))
    expect(hops.touchesS).toHaveLength(11)
    for (const touchS of hops.touchesS) expect(after(touchS)).toBeGreaterThan(30)
    expect(rung?.right).toStrictEqual(clean?.right)
  })

  it('passes slow changes of force through its low-pass and holds fast ones back', () => {
    const jump = makeJump()
    const [open, filtered] = [0, 30].map(
      (lowPassHz) => recordJump(jump, { plates: 1 }, { left: { lowPassHz } }).channels.single,
    )
    expect(filtered?.[1500]).toBeCloseTo(open?.[1500] ?? NaN, 6)
    const strikes = (force: Float64Array = new Float64Array(0)): number =>
      force.findIndex((value, i) => i > 3150 && value > 1500)
    expect(strikes(filtered) - strikes(open)).toBeCloseTo((1000 * Math.SQRT2) / (2 * Math.PI * 30), -1)
    expect(strikes(filtered) - strikes(open)).toBeGreaterThan(4)
    const noise = errorsOf({ whiteNoiseN: 2, lowPassHz: 100 })
    // White noise of 1,000 Hz through a second-order Butterworth keeps 1.11·fc/(fs/2) of its variance.
    expect(deviation(noise)).toBeCloseTo(2 * Math.sqrt((1.11 * 100) / 500), 1)
    expect(lagged(noise, 1)).toBeGreaterThan(0.6)
  })

  it('keeps only the sum of the two plates where it is told so', () => {
    const jump = makeJump()
    const { total, ...others } = recordJump(jump, { plates: 'total' }, { right: { offsetN: 3 } }).channels
    expect(others).toStrictEqual({})
    for (const i of [0, 2400, 3200]) expect(total?.[i]).toBeCloseTo(jump.force(i / 1000) + 3, 9)
  })

  it('begins where it is told on the athlete’s clock', () => {
    const jump = makeJump()
    const { single } = recordJump(jump, { plates: 1, startS: 1.00037 }).channels
    for (const i of [0, 1200, 2300]) expect(single?.[i]).toBeCloseTo(jump.force(1.00037 + i / 1000), 9)
  })

  it('reads in steps of the converter', () => {
    const { single } = recordJump(quiet, { plates: 1 }, { left: { stepN: 0.5, whiteNoiseN: 1 } }).channels
    expect([...(single ?? [])].every((force) => Number.isInteger(force * 2))).toBe(true)
  })
})

describe('seededRandom', () => {
  it('is even between 0 and 1, and its normal deviates have mean 0 and SD 1', () => {
    const random = seededRandom(42)
    const even = Float64Array.from({ length: 20_000 }, random.next)
    const normal = Float64Array.from({ length: 20_000 }, random.normal)
    expect(mean(even)).toBeCloseTo(0.5, 1)
    expect(deviation(even)).toBeCloseTo(Math.sqrt(1 / 12), 2)
    expect(mean(normal)).toBeCloseTo(0, 1)
    expect(deviation(normal)).toBeCloseTo(1, 1)
  })
})
