import { describe, expect, it } from 'vitest'
import { gravityAt, standardGravity } from './gravity.ts'

describe('gravityAt', () => {
  // Values of the 1980 series formula, evaluated apart from this code; free air −3.086e-6 per metre.
  const table: [latitudeDeg: number, altitudeM: number, gravity: number][] = [
    [0, 0, 9.780327],
    [15, 0, 9.783787],
    [30, 0, 9.793249],
    [40, 0, 9.801699],
    [45, 0, 9.8062],
    [50, 0, 9.810704],
    [51.4769, 0, 9.812015],
    [55, 0, 9.815075],
    [60, 0, 9.819179],
    [75, 0, 9.828698],
    [90, 0, 9.832186],
    [-0.18, 2850, 9.771532],
    [60.17, 20, 9.81925],
    [19.43, 2240, 9.779131],
  ]
  it.each(table)('gives at latitude %f° and %f m the published %f m/s²', (latitude, altitude, gravity) => {
    expect(gravityAt(latitude, altitude)).toBeCloseTo(gravity, 6)
  })

  it('agrees with the closed form of Somigliana within 7e-7 m/s² from equator to pole', () => {
    const somigliana = (deg: number) => {
      const s2 = Math.sin((deg * Math.PI) / 180) ** 2
      return (9.7803267715 * (1 + 0.00193185135 * s2)) / Math.sqrt(1 - 0.0066943800229 * s2)
    }
    for (let latitude = 0; latitude <= 90; latitude += 1)
      expect(Math.abs(gravityAt(latitude, 0) - somigliana(latitude))).toBeLessThan(7.1e-7)
  })

  it('is the same north and south of the equator, and meets standard gravity near 45.5°', () => {
    expect(gravityAt(-37, 120)).toBe(gravityAt(37, 120))
    expect(gravityAt(45.4973, 0)).toBeCloseTo(standardGravity, 6)
  })

  it('answers NaN for a place that does not exist', () => {
    expect(gravityAt(91, 0)).toBeNaN()
    expect(gravityAt(NaN, 0)).toBeNaN()
    expect(gravityAt(45, Infinity)).toBeNaN()
  })
})
