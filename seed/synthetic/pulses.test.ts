import { describe, expect, it } from 'vitest'
import { motionOf } from './motion.ts'
import { earlyPeak, halfSine, latePeak, raisedCosine, softRise, steepEnd, steepStart } from './pulses.ts'
import type { Pulse } from './pulses.ts'
import { integral } from './search.ts'

const pulses: Record<string, Pulse> = {
  raisedCosine,
  halfSine,
  earlyPeak,
  latePeak,
  softRise,
  steepEnd,
  steepStart,
}

describe.each(Object.entries(pulses))('%s', (_, pulse) => {
  it('integrates to its closed forms at any point', () => {
    for (const u of [0.1, 0.35, 0.5, 0.8, 1]) {
      expect(pulse.area(u)).toBeCloseTo(integral(pulse.value, 0, u), 10)
      expect(pulse.moment(u)).toBeCloseTo(integral(pulse.area, 0, u), 10)
    }
  })

  it('begins at 0, has a height of 1 and ends where it says', () => {
    const values = Array.from({ length: 1001 }, (_, i) => pulse.value(i / 1000))
    expect(values[0]).toBeCloseTo(0, 12)
    expect(Math.max(...values)).toBeCloseTo(1, 5)
    expect(values[1000]).toBeCloseTo(pulse.end, 12)
  })
})

describe('a single pulse of net force', () => {
  // Closed forms for N0 = 1000 N, T = 0.3 s, m = 80 kg: change of velocity 2N0T/πm and N0T/2m, of place N0T²/πm and N0T²/4m.
  it.each([
    ['half-sine', halfSine, 2.38732415, 0.35809862],
    ['raised cosine', raisedCosine, 1.875, 0.28125],
  ])('of the shape %s gives the velocity and the way of its closed form', (_, pulse, velocity, way) => {
    const motion = motionOf([{ pulse, start: 1, width: 0.3, amplitude: 1000 / 80 }])
    expect(motion.velocity(1.3)).toBeCloseTo(velocity, 8)
    expect(motion.displacement(1.3)).toBeCloseTo(way, 8)
    expect(motion.displacement(2.3)).toBeCloseTo(way + velocity, 8)
  })
})
