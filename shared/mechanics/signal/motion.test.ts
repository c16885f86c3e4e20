import { describe, expect, it } from 'vitest'
import { grossImpulse } from './gross-impulse.ts'
import { forceAt, instantAt, integrate } from './motion.ts'
import { meanOver, runningSums } from './running-mean.ts'

const g = 9.80665
const mass = 80
const weight = mass * g
const rate = 1000

/** Net-force pulses of 1000 N over 0.3 s on 80 kg from rest: impulse, velocity and displacement in closed form. */
const pulses: [
  name: string,
  pulse: (t: number) => number,
  impulse: number,
  velocity: number,
  displacement: number,
][] = [
  ['half-sine', (t) => Math.sin((Math.PI * t) / 0.3), 190.985932, 2.38732415, 0.35809862],
  ['triangle', (t) => 1 - Math.abs(t / 0.15 - 1), 150, 1.875, 0.28125],
  ['raised cosine', (t) => Math.sin((Math.PI * t) / 0.3) ** 2, 150, 1.875, 0.28125],
  ['quarter-sine', (t) => Math.sin((Math.PI * t) / 0.6), 190.985932, 2.38732415, 0.26025192],
]

describe('integrate', () => {
  it.each(pulses)(
    'turns a %s pulse into its closed-form velocity and displacement',
    (_, pulse, impulse, velocity, displacement) => {
      const force = Float64Array.from({ length: 301 }, (_, i) => weight + 1000 * pulse(i / rate))
      const end = instantAt(integrate(force, 0, weight, g, 1 / rate), 300)
      expect(Math.abs(end.velocity / velocity - 1)).toBeLessThan(2e-5)
      expect(Math.abs(end.displacement / displacement - 1)).toBeLessThan(3e-5)
      const gross = grossImpulse(force, runningSums(force, 'test'), 0, 300, 1 / rate)
      expect(Math.abs((gross - weight * 0.3) / impulse - 1)).toBeLessThan(2e-5)
    },
  )

  it('errs on a half-sine as the trapezoid rule does: 1 − π²/12N²', () => {
    const force = Float64Array.from({ length: 11 }, (_, i) => weight + 1000 * Math.sin((Math.PI * i) / 10))
    const { velocity } = instantAt(integrate(force, 0, weight, g, 0.03), 10)
    expect(velocity / 2.38732415 - 1).toBeCloseTo(-8.238231e-3, 7)
  })

  it('takes in the part of an interval at both ends', () => {
    // A ramp of net force integrates exactly: v = r·t²/2m from the start between two samples.
    const force = Float64Array.from({ length: 100 }, (_, i) => weight + 2 * (i - 10.4))
    const end = instantAt(integrate(force, 10.4, weight, g, 1 / rate), 60.7)
    const t = 50.3
    expect(end.velocity).toBeCloseTo((t * t) / rate / mass, 12)
    expect(end.displacement).toBeCloseTo((t * t * t) / 3 / rate / rate / mass, 12)
  })

  it('stays at rest under the weight alone', () => {
    const end = instantAt(integrate(new Float64Array(5000).fill(weight), 3.5, weight, g, 1 / rate), 4999)
    expect(end.velocity).toBe(0)
    expect(end.displacement).toBe(0)
  })

  it('hands on NaN from where it stands', () => {
    const force = new Float64Array(10).fill(weight)
    force[6] = NaN
    const motion = integrate(force, 0, weight, g, 1 / rate)
    expect(motion.velocity[5]).toBe(0)
    expect(motion.velocity[7]).toBeNaN()
  })
})

describe('grossImpulse', () => {
  const force = Float64Array.from({ length: 50 }, (_, i) => 3 * i + 7)
  const sums = runningSums(force, 'test')

  it.each([
    [0, 49],
    [10.25, 40.75],
    [10.25, 10.5],
    [10, 11],
    [12, 12],
  ])('of a straight line from %f to %f is exact', (from, to) => {
    const exact = ((3 * (from + to)) / 2 + 7) * (to - from) * 0.001
    expect(grossImpulse(force, sums, from, to, 0.001)).toBeCloseTo(exact, 12)
  })

  it('adds up over neighbouring stretches', () => {
    const part = (a: number, b: number) => grossImpulse(force, sums, a, b, 0.001)
    expect(part(3.3, 20.9) + part(20.9, 41.2)).toBeCloseTo(part(3.3, 41.2), 12)
  })
})

describe('running means', () => {
  it('are means of the stretch, cut to the record, and NaN of none', () => {
    const sums = runningSums(Float64Array.of(1e9 + 1, 1e9 + 2, 1e9 + 6), 'test')
    expect(meanOver(sums, 0, 3)).toBe(1e9 + 3)
    expect(meanOver(sums, -5, 1)).toBe(1e9 + 1)
    expect(meanOver(sums, 2, 99)).toBe(1e9 + 6)
    expect(meanOver(sums, 1, 1)).toBeNaN()
    expect(meanOver(runningSums(new Float64Array(0), 'test'), 0, 1)).toBeNaN()
  })

  it('forceAt reads a straight line between samples', () => {
    expect(forceAt(Float64Array.of(0, 10, 30), 1.25)).toBe(15)
  })
})
