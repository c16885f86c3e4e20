import { describe, expect, it } from 'vitest'
import { timeBaseOf } from './time-base.ts'

const stamps = (count: number, rateHz: number, decimals = 9, start = 0): Float64Array =>
  Float64Array.from({ length: count }, (_, i) => Number((start + i / rateHz).toFixed(decimals)))
const lineOf = (row: number): number => row + 2

describe('timeBaseOf', () => {
  it.each([
    [1000, 3],
    [500, 4],
    [600, 3],
    [1200, 3],
    [800, 3],
    [400, 3],
    [2000, 4],
    [100, 2],
  ])('finds %i Hz in stamps of %i decimals', (rateHz, decimals) => {
    const base = timeBaseOf(stamps(6 * rateHz, rateHz, decimals), lineOf)
    expect(base.sampleRateHz).toBe(rateHz)
    expect(base.error).toBeLessThan(1.3)
    expect(base.sampleOfRow).toBeNull()
  })

  it('leaves a rate that is no whole number of hertz as it is', () => {
    expect(timeBaseOf(stamps(4000, 2000 / 3), lineOf).sampleRateHz).toBeCloseTo(666.6667, 3)
  })

  it('does not mind where the clock began', () => {
    expect(timeBaseOf(stamps(3000, 1000, 3, 86_000.25), lineOf).sampleRateHz).toBe(1000)
  })

  it('reads the rate off the whole length where stamps repeat, and says that they are coarse', () => {
    const base = timeBaseOf(stamps(5000, 1000, 2), lineOf)
    expect(base.sampleRateHz).toBeCloseTo(1000, -1)
    expect(base.coarseStepS).toBeCloseTo(0.01, 6)
  })

  it('measures jitter as a fraction of a sample', () => {
    const jittered = stamps(1000, 1000)
    jittered[500] = (jittered[500] ?? 0) + 0.0004
    expect(timeBaseOf(jittered, lineOf).error).toBeCloseTo(0.4, 6)
  })

  it('leaves room for samples that are missing', () => {
    const all = stamps(1000, 1000)
    const base = timeBaseOf(Float64Array.from([...all.slice(0, 400), ...all.slice(410)]), lineOf)
    expect(base).toMatchObject({ sampleRateHz: 1000, length: 1000 })
    expect([base.sampleOfRow?.[399], base.sampleOfRow?.[400]]).toStrictEqual([399, 410])
  })

  it('sees a single missing sample', () => {
    const all = stamps(6000, 1000, 3)
    const base = timeBaseOf(Float64Array.from([...all.slice(0, 3000), ...all.slice(3001)]), lineOf)
    expect(base).toMatchObject({ sampleRateHz: 1000, length: 6000 })
  })

  it('refuses a rate that changes on the way', () => {
    const times = [...stamps(500, 1000), ...stamps(500, 500, 9, 0.5)]
    expect(() => timeBaseOf(Float64Array.from(times), lineOf)).toThrow('samples are missing')
  })

  it.each([
    ['a clock that starts again', [...stamps(500, 1000), ...stamps(500, 1000)], 502],
    ['a jump of a second', [...stamps(500, 1000), ...stamps(500, 1000, 9, 1.5)], 502],
    ['a clock that runs backwards', [...stamps(500, 1000)].reverse(), 501],
  ])('refuses %s and names the line', (_, times, line) => {
    let caught: unknown
    try {
      timeBaseOf(Float64Array.from(times), lineOf)
    } catch (error) {
      caught = error
    }
    expect(caught).toMatchObject({ readError: { code: 'uneven-time', line } })
  })
})
