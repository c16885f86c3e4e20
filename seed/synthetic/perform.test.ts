import { describe, expect, it } from 'vitest'
import type { GivenAttempt } from './attempts.ts'
import { systemKg } from './options.ts'
import type { ContactShape, LandingShape, PushShape } from './options.ts'
import { perform } from './perform.ts'
import type { Performance } from './perform.ts'
import { recordJump } from './record.ts'
import { integral } from './search.ts'
import { truthOf } from './truth.ts'

const pushes: PushShape[] = ['even', 'early', 'late', 'twoHumps']
const landings: LandingShape[] = ['onePeak', 'twoPeaks']
const contacts: ContactShape[] = ['spring', 'round', 'impact', 'early']

const edges = { takeoffEdge: 'soft', touchdownEdge: 'soft' } as const
const fourHops = (contact: ContactShape) =>
  [0.21, 0.19, 0.27, 0.2, 0.18].map((contactS, i) => ({ contactS, contact, takeoffVelocity: 2 + 0.1 * i }))

/** Every protocol in every shape. */
const attempts: [string, GivenAttempt][] = [
  ...pushes.flatMap((push) =>
    landings.map((landing): [string, GivenAttempt] => [
      `cmj, ${push}, ${landing}`,
      { protocol: 'cmj', push, landing, takeoffVelocity: 2.71, depthM: 0.29, landsLowerM: 0.03 },
    ]),
  ),
  ...pushes.map((push): [string, GivenAttempt] => [`sj, ${push}`, { protocol: 'sj', push, ...edges }]),
  ['sj from standing, with a dip', { protocol: 'sj', standsFirstS: 1, dipFraction: 0.15 }],
  ...pushes.map((push): [string, GivenAttempt] => [
    `slcmj, ${push}`,
    { protocol: 'slcmj', push, side: 'right' },
  ]),
  ...contacts.map((contact): [string, GivenAttempt] => [
    `dj, ${contact}`,
    { protocol: 'dj', contact, dropHeightM: 0.42, landsLowerM: 0.02 },
  ]),
  ...landings.map((landing): [string, GivenAttempt] => [
    `dropLanding, ${landing}`,
    { protocol: 'dropLanding', landing, landingS: 0.15, side: landing === 'onePeak' ? 'both' : 'left' },
  ]),
  ...contacts.map((contact): [string, GivenAttempt] => [
    `hops, ${contact}`,
    { protocol: 'hops', contacts: fourHops(contact) },
  ]),
]

/** Where the plates carry the athlete: between the joints, without the fall from a box. */
function spansOf({ jointsS, trials }: Performance): [number, number][] {
  const from = trials[0]?.marks.arrivalS ?? 0
  const joints = jointsS.filter((timeS) => timeS >= from)
  return joints.slice(1).map((to, i) => [joints[i] ?? to, to])
}

describe.each(attempts)('a trial of %s', (_, attempt) => {
  const performance = perform({ massKg: 68, loadKg: attempt.protocol === 'cmj' ? 20 : 0 }, [attempt])
  const [trial] = performance.trials
  if (!trial) throw new Error('There is a trial.')
  const { motion, force, marks, athlete } = trial
  const massKg = systemKg(athlete)

  it('has a force whose impulse, by quadrature, is the momentum gained', () => {
    for (const [from, to] of spansOf(performance)) {
      const impulse = integral((timeS) => force(timeS) - massKg * athlete.gravity, from, to)
      expect(impulse).toBeCloseTo(massKg * (motion.velocity(to) - motion.velocity(from)), 5)
    }
  })

  it('has a velocity whose integral is the way', () => {
    for (const [from, to] of spansOf(performance))
      expect(integral(motion.velocity, from, to)).toBeCloseTo(
        motion.displacement(to) - motion.displacement(from),
        8,
      )
  })

  it('goes from rest to rest in standing', () => {
    expect(motion.velocity(0)).toBe(0)
    for (const timeS of [marks.restS, performance.endS]) {
      expect(motion.velocity(timeS)).toBeCloseTo(0, 11)
      expect(motion.displacement(timeS)).toBeCloseTo(0, 11)
      expect(force(timeS)).toBeCloseTo(massKg * athlete.gravity, 8)
    }
  })

  it('never pulls on the plate, and flies freely', () => {
    for (let timeS = 0; timeS < marks.restS; timeS += 0.002) expect(force(timeS)).toBeGreaterThan(-1e-9)
    for (const { fromS, toS } of marks.flights) {
      for (const share of [0.01, 0.5, 0.99]) {
        const timeS = fromS + share * (toS - fromS)
        expect(force(timeS)).toBe(0)
        expect(motion.acceleration(timeS)).toBeCloseTo(-athlete.gravity, 9)
      }
    }
  })

  it('closes its ledger, but for what the body moved before the onset', () => {
    const { ledger, metrics } = truthOf(trial)
    const before = massKg * motion.velocity(ledger[0]?.startS ?? NaN)
    const within = ledger.reduce((sum, { netImpulse }) => sum + netImpulse, 0)
    expect(before + within).toBeCloseTo(0, 9)
    expect(Math.abs(before)).toBeLessThan(0.005)
    for (const value of Object.values(metrics)) expect(value).not.toBeNaN()
  })
})

describe('a squat jump', () => {
  it('is held still under its weight before it pushes, and has no force below it', () => {
    const [jump] = perform({}, [{ protocol: 'sj' }]).trials
    const lowest = Math.min(...Array.from({ length: 2000 }, (_, i) => jump?.force(i / 1000) ?? NaN))
    expect(lowest).toBeCloseTo(75 * 9.80665, 9)
    expect(jump?.motion.displacement(0)).toBeLessThan(-0.3)
    expect(jump?.motion.displacement(jump.marks.flights[0]?.fromS ?? NaN)).toBeCloseTo(0.08, 9)
  })

  it('dips by the share of weight it is told to', () => {
    const [jump] = perform({}, [{ protocol: 'sj', dipFraction: 0.12 }]).trials
    const forces = Array.from({ length: 2000 }, (_, i) => jump?.force(i / 1000) ?? NaN)
    expect(Math.min(...forces)).toBeCloseTo(0.88 * 75 * 9.80665, 2)
  })

  it('goes down from standing first where it is told to', () => {
    const [jump] = perform({}, [{ protocol: 'sj', standsFirstS: 1.5 }]).trials
    expect(jump?.motion.displacement(1.4)).toBe(0)
    expect(jump?.motion.displacement(2.6)).toBeLessThan(-0.3)
    expect(jump?.marks.startS).toBeCloseTo(1.5 + 1 + 1.8, 9)
  })
})

describe('a trial from a box', () => {
  it('begins on empty plates and strikes them at the speed of its drop', () => {
    const [jump] = perform({}, [{ protocol: 'dj', dropHeightM: 0.3, boxHeightM: 0.35 }]).trials
    const arrivalS = jump?.marks.arrivalS ?? NaN
    for (let timeS = 0; timeS < arrivalS; timeS += 0.01) expect(jump?.force(timeS)).toBe(0)
    expect(jump?.motion.velocity(arrivalS)).toBeCloseTo(-Math.sqrt(2 * 9.80665 * 0.3), 10)
    expect(jump?.motion.displacement(arrivalS)).toBeCloseTo(0.06, 10)
    expect(jump?.boxHeightM).toBe(0.35)
  })

  it.each(['left', 'right'] as const)('can be on the %s foot alone', (side) => {
    const [landing] = perform({}, [{ protocol: 'dropLanding', side }]).trials
    const { left, right } = recordJump(landing ?? perform({}, []), { durationS: 4 }).channels
    const other = side === 'left' ? right : left
    expect(other?.every((force) => force === 0)).toBe(true)
  })
})

describe('several trials in one recording', () => {
  const body = { swayVelocity: 0.002, heartbeatN: 2, heartRateHz: 1.2, fidgetN: 0 }

  it('share the quiet stance between them, and each is the trial it would be alone', () => {
    const both = perform({}, [{ protocol: 'cmj' }, { protocol: 'cmj', takeoffVelocity: 2.2 }])
    const [first, second] = both.trials.map(truthOf)
    const [alone] = perform({}, [{ protocol: 'cmj', takeoffVelocity: 2.2 }]).trials.map(truthOf)
    expect(first?.metrics.takeoffVelocity).toBeGreaterThan(second?.metrics.takeoffVelocity ?? NaN)
    for (const key of ['takeoffVelocity', 'timeToTakeoff', 'landingLoadingRate2080', 'netImpulse'])
      expect(second?.metrics[key]).toBeCloseTo(alone?.metrics[key] ?? NaN, 6)
    const quietS = (second?.events.onset ?? NaN) - (both.trials[0]?.marks.restS ?? NaN)
    expect(quietS).toBeGreaterThan(3)
  })

  it('sway on between them and not in them', () => {
    const { trials, motion } = perform({ body }, [{ protocol: 'cmj' }, { protocol: 'hops' }], 4)
    expect(Math.abs(motion.velocity(5))).toBeGreaterThan(1e-5)
    for (const { marks } of trials) {
      const [flight] = marks.flights
      const takeoff = marks === trials[0]?.marks ? 2.5 : 2.2
      expect(motion.velocity(flight?.fromS ?? NaN)).toBeCloseTo(takeoff, 10)
    }
  })

  it('leave the plates in between for as long as they are told', () => {
    const { force, trials } = perform({ body }, [
      { protocol: 'cmj', leavesForS: 1.6 },
      { protocol: 'sj', standsFirstS: 1 },
    ])
    const leftS = (trials[0]?.marks.restS ?? NaN) + 1.5
    for (let timeS = leftS + 0.13; timeS < leftS + 1.6; timeS += 0.01) expect(force(timeS)).toBe(0)
    expect(force(leftS - 0.01)).toBeGreaterThan(700)
    expect(force(leftS + 2)).toBeGreaterThan(700)
  })

  it('go from the plates to the box and back on them with the drop', () => {
    const { force, trials } = perform({ body }, [
      { protocol: 'slcmj', leavesForS: 3 },
      { protocol: 'dj' },
      { protocol: 'cmj' },
    ])
    const [, jump, last] = trials
    const truth = jump && truthOf(jump)
    expect(truth?.metrics.takeoffVelocity).toBeCloseTo(2.4, 2)
    expect(truth?.metrics.dropVelocity).toBeCloseTo(-2.4258, 2)
    expect(force((jump?.marks.arrivalS ?? NaN) - 0.01)).toBe(0)
    expect(last && truthOf(last).metrics.takeoffVelocity).toBeCloseTo(2.5, 2)
  })

  it('cannot drop from a box without having left the plates', () => {
    expect(() => perform({}, [{ protocol: 'cmj' }, { protocol: 'dj' }])).toThrow(/left the plates/)
  })
})

describe('a seed', () => {
  const body = { swayVelocity: 0.002, heartbeatN: 2, heartRateHz: 1.2, fidgetN: 0 }

  it.each(['cmj', 'sj', 'dj', 'slcmj', 'dropLanding', 'hops'] as const)(
    'makes the same %s every time, and another gives another',
    (protocol) => {
      const plates = { left: { whiteNoiseN: 1 }, right: { slowNoiseN: 1 } }
      const [a, b, c] = [5, 5, 6].map((seed) => {
        const performance = perform({ body }, [{ protocol }], seed)
        return recordJump(performance, { sampleRateHz: 500, durationS: 5 }, plates, seed)
      })
      expect(a).toStrictEqual(b)
      expect(a?.channels.left).not.toStrictEqual(c?.channels.left)
    },
  )
})
