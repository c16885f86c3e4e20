import { describe, expect, it } from 'vitest'
import { footTruthOf } from './foot-truth.ts'
import { makeJump } from './jump.ts'
import type { JumpOptions } from './options.ts'
import type { Trial } from './perform.ts'
import { integral } from './search.ts'
import { truthOf } from './truth.ts'

/**
 * A jump whose figures were worked out apart from this code, by closed form and by quadrature: 80 kg at standard
 * gravity, raised cosines of 0.45 s down and 0.36 s up, 40 ms of unloading to 2.5 m/s, 0.2 s of landing.
 */
const workedExample: Partial<JumpOptions> = {
  massKg: 80,
  takeoffVelocity: 2.5,
  depthM: 0.408264969,
  stanceS: 1,
  unweightingS: 0.45,
  pushS: 0.36,
  unloadingS: 0.04,
  takeoffEdge: 'soft',
  touchdownEdge: 'soft',
  landingS: 0.2,
  risingS: 0.8,
}

const liftOffOf = ({ marks }: Trial): number => marks.flights[0]?.fromS ?? NaN

describe('the worked example', () => {
  const { metrics, events, ledger } = truthOf(makeJump(workedExample))

  it.each([
    ['bodyWeight', 784.532, 6],
    ['takeoffVelocity', 2.52813, 5],
    ['jumpHeightImpulse', 0.32587, 5],
    ['flightTime', 0.51643, 5],
    ['timeToTakeoff', 0.84665, 5],
    ['unweightingImpulse', -99, 5],
    ['brakingImpulse', 99, 5],
    ['countermovementDepth', -0.408264969, 7],
    ['forceAtZeroVelocity', 2380.052708, 5],
    ['peakForce', 2532.813333, 5],
    ['peakPower', 4077.46461, 4],
    ['peakVelocity', 2.696133, 6],
    ['peakDownwardVelocity', -1.2375, 6],
    ['landingPeakForce', 3190.612944, 5],
    ['landingLoadingRate2080', 44866.9635, 3],
  ] as const)('has the %s worked out for it', (key, value, decimals) => {
    expect(metrics[key]).toBeCloseTo(value, decimals)
  })

  it('reaches its lowest point and its landing peak when it should', () => {
    expect(events.zeroVelocity).toBeCloseTo(1.5956133183, 8)
    expect(events.landingPeak).toBeCloseTo(2.3598581065 + 0.10448785, 7)
  })

  it('closes its ledger from rest to rest', () => {
    expect(ledger.reduce((sum, entry) => sum + entry.netImpulse, 0)).toBeCloseTo(0, 5)
  })
})

describe('sway and heartbeat', () => {
  const body = { swayVelocity: 0.003, heartbeatN: 2, heartRateHz: 1.2, fidgetN: 0 }
  const jump = makeJump({ body, stanceS: 4 }, 11)

  it('are a motion whose force is its own second derivative', () => {
    const { athlete, motion, force, marks } = jump
    for (const [from, to] of [
      [0.3, 2.1],
      [4, 4.42],
      [marks.landingEndS, 6.5],
    ] as const) {
      const impulse = integral((timeS) => force(timeS) - athlete.massKg * athlete.gravity, from, to)
      expect(impulse).toBeCloseTo(athlete.massKg * (motion.velocity(to) - motion.velocity(from)), 3)
      expect(integral(motion.velocity, from, to)).toBeCloseTo(
        motion.displacement(to) - motion.displacement(from),
        6,
      )
    }
  })

  it('leave the takeoff velocity alone and belong to the net impulse', () => {
    const { metrics, events } = truthOf(jump)
    expect(jump.motion.velocity(liftOffOf(jump))).toBeCloseTo(2.5, 12)
    const atOnset = jump.motion.velocity(events.onset ?? NaN)
    expect(Math.abs(atOnset)).toBeGreaterThan(1e-5)
    expect(metrics.netImpulse).toBeCloseTo(75 * ((metrics.takeoffVelocity ?? NaN) - atOnset), 9)
  })

  it('have about the velocity they were asked for', () => {
    let sum = 0
    for (let seed = 0; seed < 200; seed++)
      sum += makeJump({ body: { ...body, heartbeatN: 0 } }, seed).motion.velocity(1) ** 2
    expect(Math.sqrt(sum / 200)).toBeCloseTo(0.003, 3)
  })
})

describe('options of the landing', () => {
  it('touch down lower and later with knees drawn up', () => {
    const level = truthOf(makeJump()).metrics
    const lower = truthOf(makeJump({ landsLowerM: 0.05 })).metrics
    expect(lower.flightTime).toBeGreaterThan((level.flightTime ?? 0) + 0.01)
    expect(lower.jumpHeightImpulse).toBeCloseTo(level.jumpHeightImpulse ?? NaN, 9)
  })

  it('leave the landing figures out when the athlete steps off in the landing', () => {
    const stepped = makeJump({ stepOffAfterS: 0.1 })
    expect(truthOf(stepped).metrics).not.toHaveProperty('landingPeakForce')
    expect(stepped.force(stepped.marks.restS)).toBe(0)
  })

  it('split the force between the feet phase by phase', () => {
    const shares = { stance: 0.5, unweighting: 0.48, braking: 0.45, propulsion: 0.47, landing: 0.6 }
    const jump = makeJump({ shares })
    const [left, right] = [footTruthOf(jump, 'left'), footTruthOf(jump, 'right')]
    const peak = truthOf(jump).metrics.landingPeakForce ?? NaN
    expect(left.landingPeakForce).toBeCloseTo(0.6 * peak, 6)
    expect(right.landingPeakForce).toBeCloseTo(0.4 * peak, 6)
    expect((left.propulsionImpulse ?? 0) / (right.propulsionImpulse ?? 1)).toBeCloseTo(0.47 / 0.53, 1)
  })
})

describe('a loaded jump', () => {
  const [bare, loaded] = [makeJump(), makeJump({ loadKg: 40 })].map(truthOf)

  it('weighs the athlete without and the system with the load', () => {
    expect(loaded?.metrics.bodyWeight).toBeCloseTo(75 * 9.80665, 9)
    expect(loaded?.metrics.systemWeight).toBeCloseTo(115 * 9.80665, 9)
    expect(loaded?.metrics.bodyMass).toBe(75)
  })

  it('takes impulses of the system for the same motion', () => {
    const ratio = (key: string): number => (loaded?.metrics[key] ?? NaN) / (bare?.metrics[key] ?? NaN)
    for (const key of ['netImpulse', 'takeoffMomentum', 'brakingImpulse', 'landingImpulse'])
      expect(ratio(key)).toBeCloseTo(115 / 75, 2)
    expect(ratio('takeoffVelocity')).toBeCloseTo(1, 2)
  })
})

describe('the onset', () => {
  it('is that of the dip, even where the force rests at weight before the push', () => {
    const jump = makeJump({ push: 'late', takeoffVelocity: 1.8, depthM: 0.2, pushS: 0.55, unweightingS: 0.5 })
    const { minimumVelocity = NaN, onset = NaN } = truthOf(jump).events
    const weight = 75 * 9.80665
    for (let timeS = minimumVelocity - 0.05; timeS < minimumVelocity + 0.05; timeS += 0.005)
      expect(Math.abs(jump.force(timeS) - weight)).toBeLessThan(0.025 * weight)
    expect(onset - (jump.marks.startS ?? NaN)).toBeLessThan(0.05)
  })
})
