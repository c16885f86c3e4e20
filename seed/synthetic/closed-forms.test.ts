import { describe, expect, it } from 'vitest'
import { motionOf } from './motion.ts'
import { perform } from './perform.ts'
import { halfSine } from './pulses.ts'
import { firstZero, greatest } from './search.ts'
import { hopsFigures } from './true-contacts.ts'
import type { TrueContact } from './true-contacts.ts'
import { loadingRate } from './true-figures.ts'
import { truthOf } from './truth.ts'

const gravity = 9.80665

/**
 * A drop jump from 0.30 m with a half-sine contact of 0.2 s to 2.45 m/s, 70 kg: the force P·sin(πt/CT) needs
 * P = (π/2CT)·(m(|v| + v) + W·CT). All figures at the instants of zero force.
 */
describe('a drop jump with a half-sine contact', () => {
  const [jump] = perform({ massKg: 70 }, [
    { protocol: 'dj', dropHeightM: 0.3, contactS: 0.2, contact: 'spring', takeoffVelocity: 2.45 },
  ]).trials
  if (!jump) throw new Error('There is a trial.')
  const { force, motion, marks } = jump
  const [touch, left] = [marks.arrivalS ?? NaN, marks.flights[0]?.fromS ?? NaN]
  const velocity = motion.velocity(left)

  it('comes at the speed of its fall and leaves at that of its jump', () => {
    expect(motion.velocity(touch)).toBeCloseTo(-2.425694, 6)
    expect(velocity).toBeCloseTo(2.45, 12)
  })

  it('has the peak and the impulses of the closed form', () => {
    expect(greatest(force, touch, left).value).toBeCloseTo(3758.850108, 5)
    expect(70 * (velocity - motion.velocity(touch))).toBeCloseTo(341.29856, 5)
    expect(70 * (velocity - motion.velocity(touch)) + 70 * gravity * 0.2).toBeCloseTo(478.59166, 5)
  })

  it('is deepest when and where the closed form says', () => {
    const deepest = firstZero(motion.velocity, touch, left) ?? NaN
    expect(deepest - touch).toBeCloseTo(0.09972311, 8)
    expect(motion.displacement(deepest) - motion.displacement(touch)).toBeCloseTo(-0.16738234, 8)
    expect(motion.displacement(left) - motion.displacement(touch)).toBeCloseTo(0.00243063, 8)
  })

  it('has the height, the flight and the reactive strength of the closed form', () => {
    const flightS = (marks.flights[0]?.toS ?? NaN) - left
    expect(velocity ** 2 / (2 * gravity)).toBeCloseTo(0.306042, 6)
    expect(flightS).toBeCloseTo(0.499661, 6)
    expect((gravity * flightS ** 2) / 8 / (left - touch)).toBeCloseTo(1.530212, 6)
  })

  it('differs from it only by the way of the force to 10 N and back', () => {
    const { metrics } = truthOf(jump)
    expect(metrics.contactTime).toBeCloseTo(0.2 - (2 * 0.2 * Math.asin(10 / 3758.850108)) / Math.PI, 9)
    expect(metrics.rsi).toBeGreaterThan(1.530212)
    expect(metrics.rsi).toBeLessThan(1.55)
    expect(metrics.effectiveDropHeight).toBeCloseTo(0.3, 3)
    expect(metrics.netImpulse).toBeCloseTo(
      70 * ((metrics.takeoffVelocity ?? NaN) - (metrics.dropVelocity ?? NaN)),
      9,
    )
  })
})

describe('ten hops', () => {
  const contactTimes = [0.26, 0.215, 0.205, 0.198, 0.192, 0.19, 0.186, 0.188, 0.184, 0.195]
  const flightTimes = [0.44, 0.452, 0.46, 0.468, 0.47, 0.476, 0.48, 0.474, 0.482, 0.47]
  const hops = perform({}, [
    {
      protocol: 'hops',
      touchHeightM: null,
      contacts: contactTimes.map((contactS, i) => ({
        contactS,
        contact: 'spring',
        takeoffVelocity: (gravity * (flightTimes[i] ?? NaN)) / 2,
      })),
    },
  ])
  const [trial] = hops.trials
  if (!trial) throw new Error('There is a trial.')
  const { flights } = trial.marks

  it('last as long on the plates and in the air as they were asked to', () => {
    flights.slice(1).forEach(({ fromS, toS }, i) => {
      expect(toS - fromS).toBeCloseTo(flightTimes[i] ?? NaN, 10)
      expect(fromS - (flights[i]?.toS ?? NaN)).toBeCloseTo(contactTimes[i] ?? NaN, 10)
    })
  })

  it('have the reactive strengths worked out for them', () => {
    const worked = [0.9128, 1.1648, 1.2653, 1.356, 1.4103, 1.4618, 1.5184, 1.465, 1.5478, 1.3886]
    const contacts = contactTimes.map((contactTime, i): TrueContact => {
      const flightTime = flightTimes[i] ?? NaN
      const height = (gravity * flightTime ** 2) / 8
      const counted = contactTime <= 0.25
      const rest = { touchdownS: 0, takeoffS: 0, peakForce: 0, rsiFlightContact: flightTime / contactTime }
      return { contactTime, flightTime, height, rsi: height / contactTime, counted, ...rest }
    })
    contacts.forEach(({ rsi }, i) => expect(rsi).toBeCloseTo(worked[i] ?? NaN, 4))
    const figures = hopsFigures(contacts)
    expect(figures.rsiBestFive).toBeCloseTo(1.48067, 5)
    expect(contacts.filter(({ counted }) => counted)).toHaveLength(9)
  })

  it('have the same from their own force, but for the way to 10 N and back', () => {
    const { contacts, metrics } = truthOf(trial)
    expect(contacts.map(({ counted }) => counted)).toStrictEqual([false, ...Array<boolean>(9).fill(true)])
    expect(metrics.rsiBestFive).toBeGreaterThan(1.48067)
    expect(metrics.rsiBestFive).toBeCloseTo(1.485, 2)
    expect(metrics.hopCount).toBe(10)
  })
})

describe('the loading rate from 20 to 80 %', () => {
  it('of a half-sine of 2,400 N in 0.1 s is that of its closed form', () => {
    const { acceleration: force } = motionOf([{ pulse: halfSine, start: 0, width: 0.1, amplitude: 2400 }])
    expect(loadingRate(force, 0, { timeS: 0.05, value: 2400 })).toBeCloseTo(62317.964, 3)
  })

  it('of a ramp of 2,000 N in 50 ms is its slope', () => {
    expect(loadingRate((timeS) => 40_000 * timeS, 0, { timeS: 0.05, value: 2000 })).toBeCloseTo(40_000, 6)
  })
})
