/** Standard acceleration of free fall, exact, m/s² (3rd General Conference on Weights and Measures, 1901). */
export const standardGravity = 9.80665

/** International gravity formula of 1980 (Moritz, Geodetic Reference System 1980): m/s² at the equator and two series terms. */
const equatorialGravity = 9.780327
const firstTerm = 0.0053024
const secondTerm = 0.0000058

/** Free-air gradient, (m/s²) for each metre above the ellipsoid. */
const freeAirGradient = 3.086e-6

/**
 * Normal gravity at a place, m/s², from the international gravity formula of 1980 with the free-air correction.
 * Real gravity differs from it by local anomalies of some 0.001 m/s². `NaN` for a latitude that is none.
 */
export function gravityAt(latitudeDeg: number, altitudeM: number): number {
  if (!(Math.abs(latitudeDeg) <= 90) || !Number.isFinite(altitudeM)) return NaN
  const latitude = (latitudeDeg * Math.PI) / 180
  const sine = Math.sin(latitude)
  const doubleSine = Math.sin(2 * latitude)
  const atSeaLevel = equatorialGravity * (1 + firstTerm * sine * sine - secondTerm * doubleSine * doubleSine)
  return atSeaLevel - freeAirGradient * altitudeM
}
