/** What an even-loaded stretch of force says of the noise in it. */
export interface Noise {
  mean: number
  /** Standard deviation of a sample, N. */
  sd: number
  /** Autocorrelation ρ₀ = 1, ρ₁, … up to the last positive one. */
  correlation: Float64Array
  /** 1 + 2Σρ: how much more a mean wavers than with independent samples. */
  inflation: number
  samples: number
}

const longestLag = 200

/**
 * Mean, spread and autocorrelation of force[from, to), summed to the first ρ ≤ 0. One sample or none has no
 * spread: `sd` is 0 there and `samples` says so.
 */
export function estimateNoise(force: Float64Array, from: number, to: number): Noise {
  const samples = Math.max(0, to - from)
  let sum = 0
  for (let i = from; i < to; i++) sum += force[i]
  const mean = samples > 0 ? sum / samples : 0
  let squares = 0
  for (let i = from; i < to; i++) squares += (force[i] - mean) * (force[i] - mean)
  const lags = Math.min(longestLag, samples >> 2)
  const correlation = new Float64Array(Math.max(1, lags))
  correlation[0] = 1
  let inflation = 1
  let lag = 1
  for (; lag < lags; lag++) {
    let product = 0
    for (let i = from + lag; i < to; i++) product += (force[i] - mean) * (force[i - lag] - mean)
    const rho = squares > 0 ? product / squares : 0
    if (rho <= 0) break
    correlation[lag] = rho
    inflation += 2 * rho
  }
  const sd = samples > 1 ? Math.sqrt(squares / (samples - 1)) : 0
  return { mean, sd, correlation: correlation.subarray(0, lag), inflation, samples }
}

/**
 * Noise of a stretch that is short beside its correlation: correlated samples hug their own mean, which hides a part
 * 1/n_eff of their variance and of every ρ.
 */
export function allowForShortness(noise: Noise): Noise {
  const { inflation, samples, sd, correlation } = noise
  const hidden = Math.min(0.5, inflation / Math.max(1, samples))
  const whole = correlation.map((rho) => rho + hidden * (1 - rho))
  let sum = 0
  for (let lag = 1; lag < whole.length; lag++) sum += whole[lag]
  return {
    ...noise,
    inflation: 1 + 2 * sum,
    sd: sd * Math.sqrt((1 - 1 / Math.max(2, samples)) / (1 - hidden)),
    correlation: whole,
  }
}

/** Number of independent samples that a mean over the stretch is worth, at least 1. */
export function effectiveSamples(noise: Noise): number {
  return Math.max(1, noise.samples / noise.inflation)
}

/** Standard uncertainty of Σ wᵢ·force[i] for neighbouring samples with this noise. */
export function weightedNoise(weights: Float64Array, count: number, noise: Noise): number {
  let variance = 0
  const lags = Math.min(noise.correlation.length, count)
  for (let lag = 0; lag < lags; lag++) {
    let product = 0
    for (let i = lag; i < count; i++) product += weights[i] * weights[i - lag]
    variance += (lag === 0 ? 1 : 2) * noise.correlation[lag] * product
  }
  return noise.sd * Math.sqrt(Math.max(0, variance))
}

/** Standard uncertainty of the time integral of the noise over `durationS`, N·s. */
export function integratedNoise(noise: Noise, durationS: number, dt: number): number {
  return noise.sd * Math.sqrt(noise.inflation * Math.max(0, durationS) * dt)
}
