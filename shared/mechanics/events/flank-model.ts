import { solveInPlace } from '../signal/solve.ts'

/**
 * The foot of a force flank: nothing in flight, and from `foot` on a force that rises as Σ coefficients[p]·x^p, x
 * samples inside the contact, p from `lowest` to `highest`. The rise at the foot is never negative.
 */
export interface Flank {
  foot: number
  lowest: number
  highest: number
  /** By power of x, from x⁰ (always 0) to x³. */
  coefficients: Float64Array
  /** Sum of squared residuals over the window. */
  misfit: number
}

const normal = new Float64Array(9)
const rhs = new Float64Array(3)
const moments = new Float64Array(7)
const products = new Float64Array(4)

/** First sample inside the contact. */
const firstInside = (foot: number) => Math.max(0, Math.floor(foot) + 1)

/** Moments Σx^q and Σy·x^p of the samples inside the contact. */
function gather(y: Float64Array, count: number, foot: number, highest: number): void {
  moments.fill(0)
  products.fill(0)
  for (let u = firstInside(foot); u < count; u++) {
    const value = y[u]
    const x = u - foot
    let power = x
    for (let p = 1; p <= 2 * highest; p++) {
      moments[p] += power
      if (p <= highest) products[p] += value * power
      power *= x
    }
  }
}

/** Solves for the coefficients of the powers lowest…highest from the gathered moments. */
function solvePowers(into: Flank, lowest: number, highest: number): boolean {
  const n = highest - lowest + 1
  for (let r = 0; r < n; r++) {
    rhs[r] = products[lowest + r]
    for (let c = 0; c < n; c++) normal[r * n + c] = moments[2 * lowest + r + c]
  }
  if (!solveInPlace(normal, rhs, n)) return false
  into.coefficients.fill(0)
  for (let r = 0; r < n; r++) into.coefficients[lowest + r] = rhs[r]
  into.lowest = lowest
  into.highest = highest
  return true
}

/** Least-squares coefficients for a given foot; `squares` is Σy² of the whole window. */
function fitAtFoot(
  y: Float64Array,
  count: number,
  squares: number,
  foot: number,
  highest: number,
  into: Flank,
): void {
  into.foot = foot
  if (highest === 2) {
    into.misfit = squares - fitTwoPowers(y, count, foot, into)
    return
  }
  gather(y, count, foot, highest)
  let solved = solvePowers(into, 1, highest)
  if (solved && into.coefficients[1] < 0) solved = solvePowers(into, 2, highest)
  if (!solved && !solvePowers(into, 1, 1)) {
    into.coefficients.fill(0)
    into.misfit = squares
    return
  }
  let explained = 0
  for (let p = into.lowest; p <= into.highest; p++) explained += into.coefficients[p] * products[p]
  into.misfit = squares - explained
}

/**
 * The same for the usual case of slope and bend, in closed form: it is what a placing of an event spends its time
 * on. Answers how much of Σy² the fit explains.
 */
function fitTwoPowers(y: Float64Array, count: number, foot: number, into: Flank): number {
  let [s2, s3, s4, t1, t2] = [0, 0, 0, 0, 0]
  for (let u = firstInside(foot); u < count; u++) {
    const value = y[u]
    const x = u - foot
    const xx = x * x
    s2 += xx
    s3 += xx * x
    s4 += xx * xx
    t1 += value * x
    t2 += value * xx
  }
  const { coefficients } = into
  const determinant = s2 * s4 - s3 * s3
  const bends = determinant > 1e-12 * s2 * s4
  let slope = bends ? (t1 * s4 - t2 * s3) / determinant : s2 > 0 ? t1 / s2 : 0
  let bend = bends ? (t2 * s2 - t1 * s3) / determinant : 0
  const falls = bends && slope < 0
  if (falls) {
    slope = 0
    bend = t2 / s4
  }
  into.lowest = falls ? 2 : 1
  into.highest = bends ? 2 : 1
  coefficients[1] = slope
  coefficients[2] = bend
  return slope * t1 + bend * t2
}

const goldenShare = (Math.sqrt(5) - 1) / 2
/** Eleven steps narrow two samples to a hundredth. */
const goldenSteps = 11

/** Searches the foot between two places in the window: every sample first, then by golden section. */
export function searchFoot(y: Float64Array, count: number, from: number, to: number, highest: number): Flank {
  const trial: Flank = { foot: 0, lowest: 1, highest, coefficients: new Float64Array(4), misfit: Infinity }
  let squares = 0
  for (let u = 0; u < count; u++) squares += y[u] * y[u]
  const misfitAt = (foot: number) => {
    fitAtFoot(y, count, squares, foot, highest, trial)
    return trial.misfit
  }
  let best = from
  let least = Infinity
  for (let foot = from; foot <= to; foot++) {
    const misfit = misfitAt(foot)
    if (misfit < least) {
      least = misfit
      best = foot
    }
  }
  let a = best - 1
  let b = best + 1
  let left = b - 2 * goldenShare
  let right = a + 2 * goldenShare
  let atLeft = misfitAt(left)
  let atRight = misfitAt(right)
  for (let step = 0; step < goldenSteps; step++) {
    if (atLeft < atRight) {
      b = right
      right = left
      atRight = atLeft
      left = b - goldenShare * (b - a)
      atLeft = misfitAt(left)
    } else {
      a = left
      left = right
      atLeft = atRight
      right = a + goldenShare * (b - a)
      atRight = misfitAt(right)
    }
  }
  fitAtFoot(y, count, squares, (a + b) / 2, highest, trial)
  return trial
}

/** Force of the flank at x samples inside the contact. */
export function flankForce({ coefficients: c }: Flank, x: number): number {
  return x <= 0 ? 0 : x * (c[1] + x * (c[2] + x * c[3]))
}

export function flankSlope({ coefficients: c }: Flank, x: number): number {
  return c[1] + x * (2 * c[2] + x * 3 * c[3])
}

/** Distance from the foot at which the flank first reaches `force`, within `longest`; `null` if it does not. */
export function reachOf(flank: Flank, force: number, longest: number): number | null {
  let a = 0
  let b = 0
  while (flankForce(flank, b) < force) {
    a = b
    b += 0.25
    if (b > longest) return null
  }
  for (let step = 0; step < 40; step++) {
    const middle = (a + b) / 2
    if (flankForce(flank, middle) < force) a = middle
    else b = middle
  }
  return (a + b) / 2
}

const jacobian = new Float64Array(4)
const information = new Float64Array(16)
const solution = new Float64Array(4)

/** Derivatives of the flank's force at x by its coefficients and, last, by its foot; answers how many. */
function derivatives(flank: Flank, x: number): number {
  let n = 0
  for (let p = flank.lowest; p <= flank.highest; p++) jacobian[n++] = x ** p
  jacobian[n++] = -flankSlope(flank, x)
  return n
}

/**
 * How much each sample of the window moves the place where the flank crosses, by the linearised fit: the weights of a
 * linear estimator. False where the samples do not determine the fit.
 */
export function crossingWeights(
  flank: Flank,
  count: number,
  distance: number,
  weights: Float64Array,
): boolean {
  information.fill(0)
  let n = 0
  for (let u = 0; u < count; u++) {
    const x = u - flank.foot
    if (x <= 0) continue
    n = derivatives(flank, x)
    for (let r = 0; r < n; r++)
      for (let c = 0; c < n; c++) information[r * n + c] += jacobian[r] * jacobian[c]
  }
  const slope = flankSlope(flank, distance)
  for (let p = flank.lowest, r = 0; p <= flank.highest; p++, r++) solution[r] = -(distance ** p) / slope
  solution[n - 1] = 1
  if (n === 0 || !solveInPlace(information, solution, n)) return false
  for (let u = 0; u < count; u++) {
    weights[u] = 0
    const x = u - flank.foot
    if (x <= 0) continue
    derivatives(flank, x)
    for (let r = 0; r < n; r++) weights[u] += solution[r] * jacobian[r]
  }
  return true
}
