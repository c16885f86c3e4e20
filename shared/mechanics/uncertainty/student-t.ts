/** Standard normal deviate at which the two tails together hold `tails`. Rational start (Abramowitz, Stegun 26.2.23), two Newton steps on erfc. */
function normalDeviate(tails: number): number {
  const half = tails / 2
  const t = Math.sqrt(-2 * Math.log(half))
  let x =
    t - (2.515517 + t * (0.802853 + t * 0.010328)) / (1 + t * (1.432788 + t * (0.189269 + t * 0.001308)))
  for (let step = 0; step < 3; step++) {
    const density = Math.exp((-x * x) / 2) / Math.sqrt(2 * Math.PI)
    x += (upperTail(x) - half) / density
  }
  return x
}

/** Upper tail of the standard normal distribution, by the continued fraction (x > 1) or the series. */
function upperTail(x: number): number {
  const density = Math.exp((-x * x) / 2) / Math.sqrt(2 * Math.PI)
  if (x < 2) {
    let term = x
    let sum = x
    for (let n = 1; n < 60; n++) {
      term *= (x * x) / (2 * n + 1)
      sum += term
    }
    return 0.5 - density * sum
  }
  let fraction = 0
  for (let n = 80; n > 0; n--) fraction = n / (x + fraction)
  return density / (x + fraction)
}

/** The last coverage asked for and its normal deviate: a trial asks for one coverage a hundred times. */
let known = { tails: NaN, deviate: NaN }

function deviateFor(tails: number): number {
  if (known.tails !== tails) known = { tails, deviate: normalDeviate(tails) }
  return known.deviate
}

/** From this many degrees of freedom on, the Cornish–Fisher series is good to a millionth. */
const seriesFrom = 30

/** Fisher, Cornish 1960: t in powers of 1/dof about the normal deviate (Abramowitz, Stegun 26.7.5). */
function series(x: number, dof: number): number {
  const x2 = x * x
  const g1 = (x * (x2 + 1)) / 4
  const g2 = (x * ((5 * x2 + 16) * x2 + 3)) / 96
  const g3 = (x * (((3 * x2 + 19) * x2 + 17) * x2 - 15)) / 384
  return x + (g1 + (g2 + g3 / dof) / dof) / dof
}

/**
 * Student's t: the factor that holds `coverage` (two-sided) at `dof` degrees of freedom, which need not be whole.
 * G. W. Hill 1970, Algorithm 396, Commun ACM 13:619–620; to some six digits. Below one degree of freedom, as at one.
 */
export function studentT(coverage: number, dof: number): number {
  const tails = 1 - coverage
  if (!(dof < seriesFrom))
    return dof >= seriesFrom && dof < Infinity ? series(deviateFor(tails), dof) : deviateFor(tails)
  const n = Math.max(1, dof)
  if (n === 1) return Math.cos((tails * Math.PI) / 2) / Math.sin((tails * Math.PI) / 2)
  if (n === 2) return Math.sqrt(2 / (tails * (2 - tails)) - 2)
  const a = 1 / (n - 0.5)
  const b = 48 / (a * a)
  let c = ((20700 * a) / b - 98) * a - 16
  c = c * a + 96.36
  const d = ((94.5 / (b + c) - 3) / b + 1) * Math.sqrt((a * Math.PI) / 2) * n
  let x = d * tails
  let y = Math.pow(x, 2 / n)
  if (y > 0.05 + a) {
    x = -deviateFor(tails)
    y = x * x
    if (n < 5) c += 0.3 * (n - 4.5) * (x + 0.6)
    c = (((0.05 * d * x - 5) * x - 7) * x - 2) * x + b + c
    y = (((((0.4 * y + 6.3) * y + 36) * y + 94.5) / c - y - 3) / b + 1) * x
    y = Math.expm1(a * y * y)
  } else {
    y =
      ((1 / (((n + 6) / (n * y) - 0.089 * d - 0.822) * (n + 2) * 3) + 0.5 / (n + 4)) * y - 1) *
        ((n + 1) / (n + 2)) +
      1 / y
  }
  return Math.sqrt(n * y)
}
