import { describe, expect, it } from 'vitest'
import { integrateAround } from './anchored-motion.ts'
import { instantAt, integrate } from './motion.ts'

const dt = 0.001
const [mass, gravity] = [80, 9.80665]
const weight = mass * gravity
/** Half a sine of net force, from 0.2 s to 0.5 s. */
const force = Float64Array.from({ length: 1001 }, (_, i) => {
  const u = (i * dt - 0.2) / 0.3
  return weight + (u > 0 && u < 1 ? 1000 * Math.sin(Math.PI * u) : 0)
})
/** Change of velocity and way of that pulse in closed form, from and towards rest. */
const gain = (2 * 1000 * 0.3) / (Math.PI * mass)

describe('the motion around an instant of known velocity', () => {
  it('runs backwards from rest to what must have been before', () => {
    const motion = integrateAround(force, 100, { position: 800.5, velocity: 0 }, weight, gravity, dt)
    // The trapezoid rule leaves (π·dt/width)²/12 of the pulse: 1e-5 of it at 1 ms.
    expect(instantAt(motion, 150.25).velocity).toBeCloseTo(-gain, 4)
    expect(instantAt(motion, 800.5).velocity).toBeCloseTo(0, 12)
    expect(instantAt(motion, 800.5).displacement).toBeCloseTo(0, 12)
    // Half of the pulse's time at the full velocity, by symmetry, and what lies before it.
    const way = -gain * (0.15 + (0.2 - 0.15025))
    expect(-instantAt(motion, 150.25).displacement).toBeCloseTo(way, 4)
  })

  it('runs forwards as from rest where the anchor is the start', () => {
    const around = integrateAround(force, 100, { position: 100, velocity: 0 }, weight, gravity, dt)
    const [aroundAt, aroundWay] = [around.velocity.slice(), around.displacement.slice()]
    const forwards = integrate(force, 100, weight, gravity, dt)
    for (let i = 100; i <= 1000; i += 50) {
      expect(aroundAt[i]).toBeCloseTo(forwards.velocity[i], 12)
      expect(aroundWay[i]).toBeCloseTo(forwards.displacement[i], 12)
    }
  })

  it('takes on a velocity that a flight has told', () => {
    const motion = integrateAround(force, 0, { position: 600, velocity: 2 }, weight, gravity, dt)
    expect(instantAt(motion, 600).velocity).toBeCloseTo(2, 12)
    expect(instantAt(motion, 100).velocity).toBeCloseTo(2 - gain, 4)
    expect(instantAt(motion, 700).displacement).toBeCloseTo(0.2, 9)
  })
})
