import { tQuantile } from './t-quantile.ts'

/** Degree of the interpolation: to 1e-9 at a coverage of 95 %, to 1e-7 at 99.9 %. */
const DEGREE = 16

/** Chebyshev points of the second kind in 1/dof, from 0 (infinite) to 1, and their barycentric weights. */
const points = Float64Array.from({ length: DEGREE + 1 }, (_, k) => (1 - Math.cos((Math.PI * k) / DEGREE)) / 2)
const weights = Float64Array.from(points, (_, k) => (k % DEGREE === 0 ? 0.5 : 1) * (k % 2 === 0 ? 1 : -1))

/** ln t at the points for the last coverage asked for: a trial asks for one coverage a hundred times. */
let known = { coverage: NaN, logT: new Float64Array(0) }

function logTFor(coverage: number): Float64Array {
  if (known.coverage !== coverage) {
    const logT = points.map((inverse) => Math.log(tQuantile((1 + coverage) / 2, 1 / inverse)))
    known = { coverage, logT }
  }
  return known.logT
}

/**
 * Student's t: the factor that holds `coverage` (two-sided, 0 to 1) at `dof` degrees of freedom, which need not be
 * whole. Below one degree of freedom, as at one; NaN (nothing statistical) as infinite.
 * ln t is smooth in 1/dof, so it is interpolated there between Chebyshev points (Berrut, Trefethen 2004, SIAM Review
 * 46:501–517, eq. 4.2): a hundredth of the time of `tQuantile`, which gives the points. Hill's algorithm 396 (1970),
 * used before, is 14 % wide between one and two degrees of freedom.
 */
export function studentT(coverage: number, dof: number): number {
  const logT = logTFor(coverage)
  const inverse = dof >= 1 ? 1 / dof : dof < 1 ? 1 : 0
  let above = 0
  let below = 0
  for (let k = 0; k <= DEGREE; k++) {
    const distance = inverse - points[k]
    if (distance === 0) return Math.exp(logT[k])
    const weight = weights[k] / distance
    above += weight * logT[k]
    below += weight
  }
  return Math.exp(above / below)
}
