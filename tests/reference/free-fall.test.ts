import { describe, expect, it } from 'vitest'
import { analyse } from '../../shared/mechanics/analyse.ts'
import type { Recording } from '../../shared/mechanics/types.ts'
import { standardGravity } from '../../shared/units/gravity.ts'

const mass = 70
const weight = mass * standardGravity
const rate = 2000

/** A sin² dip, a quarter-period sin² push that ends with a step at takeoff velocity `v`, and a landing that mirrors it. */
function jumpTo(v: number): Recording {
  const flight = (2 * v) / standardGravity
  const dip = 0.4
  const push = 0.35
  const a1 = 3
  const force = (t: number) => {
    if (t < 1.5) return weight
    if (t < 1.5 + dip) return weight - mass * a1 * Math.sin((Math.PI * (t - 1.5)) / dip) ** 2
    const start = 1.5 + dip
    if (t < start + push)
      return (
        weight +
        (2 * mass * (v + (a1 * dip) / 2) * Math.sin((Math.PI * (t - start)) / (2 * push)) ** 2) / push
      )
    if (t < start + push + flight) return 0
    const landed = t - start - push - flight
    if (landed < push) return weight + (2 * mass * v * Math.cos((Math.PI * landed) / (2 * push)) ** 2) / push
    return weight
  }
  const n = Math.round((1.5 + dip + push + flight + push + 1.6) * rate)
  return {
    sampleRateHz: rate,
    channels: { total: Float64Array.from({ length: n }, (_, i) => force(i / rate)) },
    filledSamples: 0,
    timeBaseError: 0,
    notes: [],
  }
}

describe('height, velocity and flight time', () => {
  // Free fall with g = 9.80665 m/s²: h = v²/2g and t = 2v/g.
  const table: [heightM: number, velocity: number, flightS: number][] = [
    [0.1, 1.400475, 0.285617],
    [0.2, 1.980571, 0.403924],
    [0.3, 2.425694, 0.494704],
    [0.4, 2.80095, 0.571235],
    [0.45, 2.970856, 0.605886],
    [0.5, 3.131557, 0.63866],
    [0.6, 3.430449, 0.699617],
  ]
  it.each(table)('of a jump of %f m are those of free fall: %f m/s, %f s', (height, velocity, flightS) => {
    const [trial] = analyse(jumpTo(velocity), { gravity: standardGravity, calibrationU: {} }).trials
    const { takeoffVelocity, flightTime, jumpHeightImpulse, jumpHeightFlight } = trial.metrics
    // The force ends with a step here, so takeoff and touchdown are known to a sample only: 0.5 ms, 5 mm/s.
    expect(Math.abs(takeoffVelocity.value - velocity)).toBeLessThan(0.01)
    expect(Math.abs(flightTime.value - flightS)).toBeLessThan(0.001)
    expect(Math.abs(jumpHeightImpulse.value - height)).toBeLessThan(0.0035)
    expect(Math.abs(jumpHeightFlight.value - height)).toBeLessThan(0.0025)
  })

  it('are tied to each other by g alone', () => {
    const [trial] = analyse(jumpTo(2.4), { gravity: standardGravity, calibrationU: {} }).trials
    const { takeoffVelocity, flightTime, jumpHeightImpulse, jumpHeightFlight } = trial.metrics
    expect(jumpHeightImpulse.value).toBeCloseTo(takeoffVelocity.value ** 2 / (2 * standardGravity), 12)
    expect(jumpHeightFlight.value).toBeCloseTo((standardGravity * flightTime.value ** 2) / 8, 12)
  })
})
