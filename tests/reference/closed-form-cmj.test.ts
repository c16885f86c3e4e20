import { describe, expect, it } from 'vitest'
import { analyse } from '../../shared/mechanics/analyse.ts'
import type { AnalyseOptions, EventName, TrialAnalysis } from '../../shared/mechanics/types.ts'
import { standardGravity } from '../../shared/units/gravity.ts'
import {
  forceAt,
  knots,
  mass,
  motionAt,
  sampled,
  trueEvents,
  weight,
  type Sampling,
} from '../setup/closed-form-cmj.ts'

const options: AnalyseOptions = { gravity: standardGravity, calibrationU: {} }
const truth = trueEvents()

function trialOf(sampling: Sampling): TrialAnalysis {
  const { trials } = analyse(sampled(sampling), options)
  expect(trials).toHaveLength(1)
  return trials[0]
}

describe('the closed-form jump itself', () => {
  it('has the published values at zero force', () => {
    const zeroForce = motionAt(knots[3] - 1e-12)
    expect(zeroForce.velocity).toBeCloseTo(2.5, 9)
    expect(zeroForce.displacement).toBeCloseTo(0.0896288942, 9)
    expect(motionAt(truth.zeroVelocity).displacement).toBeCloseTo(-0.408264969, 8)
    expect(forceAt(truth.zeroVelocity)).toBeCloseTo(2380.052708, 5)
    expect(forceAt(truth.landingPeak)).toBeCloseTo(3190.612944, 5)
    expect(motionAt(10).velocity).toBeCloseTo(0, 12)
    expect(motionAt(10).displacement).toBeCloseTo(0, 12)
  })

  it('has the published values at 10 N', () => {
    const { velocity } = motionAt(truth.takeoff)
    expect(velocity).toBeCloseTo(2.52813, 5)
    expect((velocity * velocity) / (2 * standardGravity)).toBeCloseTo(0.32587, 5)
    expect(truth.touchdown - truth.takeoff).toBeCloseTo(0.51643, 5)
    expect(truth.takeoff - knots[0]).toBeCloseTo(0.84712, 5)
  })
})

describe.each([500, 1000, 2000, 10000])('the engine on the closed-form jump at %i Hz', (sampleRateHz) => {
  const trial = trialOf({ sampleRateHz, channels: 'feet', shareLeft: 0.48 })
  const figure = (key: string) => trial.metrics[key].value

  const tolerances: Partial<Record<EventName, number>> = {
    onset: 0.1e-3,
    minimumForce: 0.01e-3,
    minimumVelocity: 0.5e-3,
    zeroVelocity: 0.02e-3,
    takeoff: 0.05e-3,
    touchdown: 0.05e-3,
    landingPeak: 0.05e-3,
  }
  it.each(Object.entries(tolerances))('places %s within %f s of the continuous curve', (name, tolerance) => {
    const event = trial.events[name as EventName]
    expect(Math.abs((event?.timeS ?? NaN) - truth[name as keyof typeof truth])).toBeLessThan(tolerance)
  })

  it('finds weight, velocity, heights and times', () => {
    expect(figure('bodyWeight')).toBeCloseTo(weight, 6)
    expect(figure('bodyMass')).toBeCloseTo(mass, 8)
    const { velocity, displacement } = motionAt(truth.takeoff)
    expect(Math.abs(figure('takeoffVelocity') - velocity)).toBeLessThan(0.0005)
    expect(Math.abs(figure('jumpHeightImpulse') - velocity ** 2 / (2 * standardGravity))).toBeLessThan(0.0002)
    expect(
      Math.abs(figure('jumpHeightTotal') - velocity ** 2 / (2 * standardGravity) - displacement),
    ).toBeLessThan(0.0003)
    expect(Math.abs(figure('flightTime') - truth.touchdown + truth.takeoff)).toBeLessThan(0.0001)
    expect(Math.abs(figure('timeToTakeoff') - truth.takeoff + truth.onset)).toBeLessThan(0.0002)
    expect(Math.abs(figure('takeoffMomentum') - mass * velocity)).toBeLessThan(0.05)
  })

  it('finds depth, forces, power and work of the push', () => {
    const deepest = motionAt(truth.zeroVelocity)
    expect(figure('countermovementDepth')).toBeCloseTo(deepest.displacement, 4)
    expect(Math.abs(figure('forceAtZeroVelocity') / deepest.force - 1)).toBeLessThan(2e-4)
    expect(Math.abs(figure('peakForce') / 2532.813333 - 1)).toBeLessThan(1e-4)
    expect(Math.abs(figure('peakPower') / 4077.46461 - 1)).toBeLessThan(1e-3)
    expect(figure('peakDownwardVelocity')).toBeCloseTo(-1.2375, 4)
    expect(figure('unweightingImpulse')).toBeCloseTo(-99, 2)
    // Work from zero velocity to the instant of 10 N: kinetic and potential energy at both ends.
    const end = motionAt(truth.takeoff)
    const work = (mass / 2) * end.velocity ** 2 + weight * (end.displacement - deepest.displacement)
    expect(Math.abs(figure('propulsionWork') / work - 1)).toBeLessThan(5e-4)
    expect(
      Math.abs(figure('meanPropulsionPower') / (work / (truth.takeoff - truth.zeroVelocity)) - 1),
    ).toBeLessThan(1e-3)
  })

  it('finds the landing', () => {
    const peak = forceAt(truth.landingPeak)
    expect(Math.abs(figure('landingPeakForce') / peak - 1)).toBeLessThan(1e-4)
    // Published for the curve itself: 20 and 80 % of the peak at 30.55829 and 73.22594 ms after zero force.
    expect(Math.abs(figure('landingLoadingRate2080') / 44866.9635 - 1)).toBeLessThan(5e-4)
    expect(
      Math.abs(figure('landingLoadingRateMean') / (peak / (truth.landingPeak - truth.touchdown)) - 1),
    ).toBeLessThan(2e-3)
    expect(Math.abs(figure('landingLoadingRateMax') / 48149.2389 - 1)).toBeLessThan(1e-2)
    expect(Math.abs(figure('landingVelocity') - motionAt(truth.touchdown).velocity)).toBeLessThan(0.001)
  })

  it('closes the ledger: entries add up to the closing balance, which is nothing within its uncertainty', () => {
    const { ledger } = trial
    const sum = ledger?.entries.reduce((total, { netImpulse }) => total + netImpulse, 0) ?? NaN
    expect(ledger?.entries.map(({ phase }) => phase)).toEqual([
      'unweighting',
      'braking',
      'propulsion',
      'flight',
      'landing',
      'settling',
    ])
    expect(sum).toBeCloseTo(ledger?.closing.value ?? NaN, 9)
    expect(Math.abs(sum)).toBeLessThan(0.05)
    expect(ledger?.closing.closes).toBe(true)
    expect(ledger?.entries[3].netImpulse).toBeCloseTo(
      mass * (motionAt(truth.touchdown).velocity - motionAt(truth.takeoff).velocity),
      0,
    )
  })

  it('passes every check and misses nothing', () => {
    expect(trial.checks.filter(({ verdict }) => verdict === 'fail')).toEqual([])
    expect(trial.missing).toEqual([])
  })

  it('finds the drawn asymmetry of 8 % in force, right the larger', () => {
    // 52 to 48: (0.52 − 0.48)/0.5 · 100 %.
    for (const key of ['landingPeakForce', 'meanPropulsionForce', 'brakingGrossImpulse', 'stanceForce']) {
      expect(trial.sides?.asymmetry[key].value, key).toBeCloseTo(8, 2)
      expect(trial.sides?.asymmetry[key].larger).toBe('right')
    }
  })
})

describe('errors of the plates on the closed-form jump', () => {
  const velocity = (sampling: Sampling) => trialOf(sampling).metrics.takeoffVelocity.value
  const clean = velocity({})

  it('a zero offset is found and taken off', () => {
    const trial = trialOf({ disturb: (force) => force + 5 })
    expect(trial.metrics.takeoffVelocity.value).toBeCloseTo(clean, 6)
    expect(trial.metrics.bodyWeight.value).toBeCloseTo(weight, 6)
  })

  it('a gain of 2 % cancels in velocity and height and shows in weight and impulse', () => {
    const trial = trialOf({ disturb: (force) => 1.02 * force })
    expect(Math.abs(trial.metrics.takeoffVelocity.value - clean)).toBeLessThan(0.001)
    expect(trial.metrics.bodyWeight.value).toBeCloseTo(1.02 * weight, 6)
    expect(trial.metrics.netImpulse.value / trialOf({}).metrics.netImpulse.value).toBeCloseTo(1.02, 3)
  })

  it('a plate tared with the athlete on it is put right, and says so', () => {
    const trial = trialOf({ disturb: (force) => force - weight })
    expect(trial.metrics.takeoffVelocity.value).toBeCloseTo(clean, 6)
    expect(trial.notes.map(({ code }) => code)).toContain('tared-with-athlete')
  })

  it('an offset that comes after the weighing leaves the momentum that physics asks for: b·T', () => {
    const b = 10
    const trial = trialOf({ disturb: (force, t) => (t > 0.999 && t < 1.8 ? force + b : force) })
    const shift = trial.metrics.takeoffVelocity.value - clean
    expect(shift).toBeCloseTo((b * 0.8) / mass, 2)
    expect(trial.checks.find(({ key }) => key === 'closing-balance')?.verdict).not.toBe('pass')
  })

  it('one foot touching down 5 ms later shows as a lag, not as an asymmetry of the push', () => {
    const late = sampled({ channels: 'feet' })
    const right = late.channels.right as Float64Array
    const shifted = right.map((force, i) => (i > 2100 && i >= 5 ? right[i - 5] : force))
    const [trial] = analyse({ ...late, channels: { ...late.channels, right: shifted } }, options).trials
    expect(trial.metrics.feetTouchdownLag.value).toBeCloseTo(0.005, 4)
    expect(trial.sides?.asymmetry.meanPropulsionForce.value).toBeCloseTo(0, 6)
  })
})
