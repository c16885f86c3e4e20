import { describe, expect, it } from 'vitest'
import { analyse } from '../../shared/mechanics/analyse.ts'
import { heightOfVelocity } from '../../shared/mechanics/metrics/jump.ts'
import type { AnalyseOptions, Test, TrialAnalysis } from '../../shared/mechanics/types.ts'
import { Budget } from '../../shared/mechanics/uncertainty/budget.ts'
import { standardGravity } from '../../shared/units/gravity.ts'
import {
  contactS,
  dropHeightM,
  fallSpeed,
  greatestForce,
  leaves,
  mass,
  motionAt,
  sampled,
  trueEvents,
  weight,
  zeroForce,
  type Sampling,
} from '../setup/closed-form-dj.ts'

const test: Test = { protocol: 'dj', side: 'both', externalLoadKg: 0, boxHeightM: 0.3, arms: 'hips' }
const options: AnalyseOptions = { test, gravity: standardGravity, calibrationU: {} }
const truth = trueEvents()

function trialOf(sampling: Sampling, more: Partial<AnalyseOptions> = {}): TrialAnalysis {
  const { trials } = analyse(sampled(sampling), { ...options, ...more })
  expect(trials).toHaveLength(1)
  return trials[0]
}

describe('the closed-form drop jump itself', () => {
  // Half-sine F = P·sin(πt/T): P = (π/2T)·(m(|v| + v₀) + W·T). Values by closed form and quadrature.
  it('has the values that were worked out for it at zero force', () => {
    expect(fallSpeed).toBeCloseTo(2.425694, 6)
    expect(greatestForce).toBeCloseTo(3758.850108, 6)
    expect(greatestForce / weight).toBeCloseTo(5.475658, 6)
    const zeroVelocity = truth.zeroVelocity - (zeroForce - contactS)
    expect(zeroVelocity).toBeCloseTo(0.09972311, 8)
    const arrival = motionAt(zeroForce - contactS)
    expect(motionAt(truth.zeroVelocity).displacement - arrival.displacement).toBeCloseTo(-0.16738234, 8)
    const end = motionAt(zeroForce - 1e-12)
    expect(end.displacement - arrival.displacement).toBeCloseTo(0.00243063, 8)
    expect(end.velocity).toBeCloseTo(leaves, 9)
    expect(mass * (end.velocity + fallSpeed)).toBeCloseTo(341.29856, 5)
    expect(motionAt(10).velocity).toBe(0)
  })
})

describe.each([500, 1000, 2000])('the engine on the closed-form drop jump at %i Hz', (sampleRateHz) => {
  const trial = trialOf({ sampleRateHz, channels: 'feet', shareLeft: 0.48 })
  const figure = (key: string) => trial.metrics[key].value
  const [arrival, takeoff] = [motionAt(truth.arrival), motionAt(truth.takeoff)]

  // The force starts with 59 kN/s: 10 N are reached within 0.2 ms, and the kink lies between two samples.
  it.each(['arrival', 'takeoff', 'touchdown'] as const)('places %s within 0.1 ms of the curve', (name) => {
    expect(Math.abs((trial.events[name]?.timeS ?? NaN) - truth[name])).toBeLessThan(1e-4)
  })

  it('weighs in the stance after the landing and finds both velocities by integration backwards', () => {
    expect(figure('bodyWeight')).toBeCloseTo(weight, 6)
    expect(figure('dropVelocity')).toBeCloseTo(arrival.velocity, 2)
    expect(Math.abs(figure('takeoffVelocity') - takeoff.velocity)).toBeLessThan(0.002)
    expect(
      Math.abs(figure('jumpHeightTotal') - figure('jumpHeightImpulse') - takeoff.displacement),
    ).toBeLessThan(0.001)
  })

  it('finds the height that the athlete fell from', () => {
    // At 10 N the fall is a fifth of a millisecond longer than at the first touch: under 1 mm.
    expect(Math.abs(figure('effectiveDropHeight') - dropHeightM)).toBeLessThan(0.002)
    expect(trial.checks.find(({ key }) => key === 'drop-height')?.verdict).toBe('pass')
  })

  it('finds contact time, flight time and RSI', () => {
    const contact = truth.takeoff - truth.arrival
    const flight = truth.touchdown - truth.takeoff
    const height = (standardGravity * flight ** 2) / 8
    expect(Math.abs(figure('contactTime') - contact)).toBeLessThan(1.5e-4)
    expect(Math.abs(figure('rsi') / (height / contact) - 1)).toBeLessThan(1.5e-3)
    expect(Math.abs(figure('rsiFlightContact') / (flight / contact) - 1)).toBeLessThan(1.5e-3)
    expect(trial.contacts).toHaveLength(1)
    expect(trial.contacts?.[0].counted).toBe(true)
    expect(trial.contacts?.[0].rsi).toEqual(trial.metrics.rsi)
  })

  it('keeps its identities', () => {
    const m = figure('systemWeight') / standardGravity
    expect(figure('netImpulse')).toBeCloseTo(m * (figure('takeoffVelocity') - figure('dropVelocity')), 9)
    expect(figure('brakingImpulse')).toBeCloseTo(-m * figure('dropVelocity'), 9)
    expect(figure('propulsionImpulse')).toBeCloseTo(m * figure('takeoffVelocity'), 9)
    expect(figure('landingImpulse')).toBeCloseTo(-m * figure('landingVelocity'), 9)
    expect(Math.abs(figure('peakForce') / greatestForce - 1)).toBeLessThan(1e-3)
  })

  it('opens the ledger with the momentum of the fall, and says that its closing cannot be tested', () => {
    const { entries, closing } = trial.ledger as NonNullable<TrialAnalysis['ledger']>
    expect(entries.map(({ phase }) => phase)).toEqual([
      'arrival',
      'braking',
      'propulsion',
      'flight',
      'landing',
      'settling',
    ])
    expect(entries[0].netImpulse).toBeCloseTo(mass * arrival.velocity, 0)
    expect(closing.closes).toBeNull()
    expect(Math.abs(closing.value)).toBeLessThan(1e-6)
  })

  it('passes every check, misses nothing, and shares the contact out to the feet as drawn', () => {
    expect(trial.checks.filter(({ verdict }) => verdict !== 'pass')).toEqual([])
    expect(trial.missing).toEqual([])
    // 52 to 48: (0.52 − 0.48)/0.5 · 100 %.
    for (const key of [
      'peakBrakingForce',
      'brakingGrossImpulse',
      'propulsionGrossImpulse',
      'landingPeakForce',
    ])
      expect(trial.sides?.asymmetry[key].value, key).toBeCloseTo(8, 2)
  })
})

describe('a drop jump without quiet stance after it', () => {
  const short = { quietS: -0.7 }

  it('goes by the recorded mass and the time in the air, says so, and is less sure', () => {
    const trial = trialOf(short, { recordedMassKg: mass })
    expect(trial.notes.map(({ code }) => code)).toContain('recorded-mass-used')
    expect(trial.metrics.bodyWeight).toBeUndefined()
    expect(Math.abs(trial.metrics.takeoffVelocity.value - leaves)).toBeLessThan(0.05)
    expect(Math.abs(trial.metrics.dropVelocity.value + fallSpeed)).toBeLessThan(0.05)
    const weighed = trialOf({})
    expect(trial.metrics.takeoffVelocity.U as number).toBeGreaterThan(
      3 * (weighed.metrics.takeoffVelocity.U as number),
    )
  })

  it('has neither weight nor velocity without a recorded mass, but times and forces', () => {
    const trial = trialOf(short)
    expect(trial.missing.map(({ key }) => key)).toEqual(
      expect.arrayContaining(['bodyWeight', 'takeoffVelocity', 'dropVelocity', 'netImpulse']),
    )
    for (const { reason } of trial.missing) expect(reason).toMatch(/stand still/)
    expect(trial.metrics.contactTime.value).toBeCloseTo(truth.takeoff - truth.arrival, 3)
    expect(trial.metrics.rsi.value).toBeGreaterThan(1)
    expect(trial.metrics.landingPeakForce.value).toBeGreaterThan(1000)
    expect(trial.ledger).toBeNull()
    expect(trial.checks.find(({ key }) => key === 'weighing-length')?.verdict).toBe('fail')
  })
})

describe('impact speed from a box', () => {
  // Free fall: v = √(2gh) with g = 9.80665 m/s²; the engine's height of a velocity turns it back.
  const budget = new Budget(false, 0.95)
  const height = (speed: number) =>
    heightOfVelocity({ budget, gravity: budget.exact(standardGravity) }, budget.exact(-speed)).value
  it.each([
    [2.4257, 0.3],
    [2.801, 0.4],
    [3.4304, 0.6],
  ])('of %f m/s is that of a fall from %f m', (speed, heightM) => {
    expect(Math.abs(height(speed) - heightM)).toBeLessThan(2e-5)
  })

  it('is what the effective drop height is worked out from', () => {
    const { dropVelocity, effectiveDropHeight } = trialOf({}).metrics
    expect(effectiveDropHeight.value).toBeCloseTo(dropVelocity.value ** 2 / (2 * standardGravity), 12)
  })

  it('of another height than the box fails the check, and takes the jump away', () => {
    const trial = trialOf({}, { test: { ...test, boxHeightM: 0.6 } })
    const check = trial.checks.find(({ key }) => key === 'drop-height')
    expect(check?.verdict).toBe('fail')
    expect(check?.affects).toContain('jump')
  })
})
