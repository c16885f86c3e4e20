/** Coefficients of a second-order section: y = b0·x + b1·x₁ + b2·x₂ − a1·y₁ − a2·y₂. */
export interface Section {
  b0: number
  b1: number
  b2: number
  a1: number
  a2: number
}

/** Correction of the cut-off for two passes of a second-order filter (Winter, Biomechanics and Motor Control, 4th ed., p. 69). */
const twoPasses = Math.pow(Math.SQRT2 - 1, 0.25)

/** Second-order Butterworth low-pass whose double pass has its −3 dB point at `cutoffHz` (bilinear transform). */
export function lowPass(cutoffHz: number, sampleRateHz: number): Section {
  const w = Math.tan((Math.PI * cutoffHz) / sampleRateHz) / twoPasses
  const k1 = Math.SQRT2 * w
  const k2 = w * w
  const b0 = k2 / (1 + k1 + k2)
  const k3 = (2 * b0) / k2
  return { b0, b1: 2 * b0, b2: b0, a1: -(-2 * b0 + k3), a2: -(1 - 2 * b0 - k3) }
}

/** One pass in place, forwards or backwards, begun as if the first value had always been there. */
function pass(y: Float64Array, { b0, b1, b2, a1, a2 }: Section, backwards: boolean): void {
  const n = y.length
  const start = backwards ? n - 1 : 0
  const step = backwards ? -1 : 1
  let x1 = y[start]
  let x2 = x1
  let y1 = x1
  let y2 = x1
  for (let k = 0, i = start; k < n; k++, i += step) {
    const x = y[i]
    const out = b0 * x + b1 * x1 + b2 * x2 - a1 * y1 - a2 * y2
    x2 = x1
    x1 = x
    y2 = y1
    y1 = out
    y[i] = out
  }
}

/**
 * Zero-lag low-pass of force[from, to): forwards and backwards over the stretch, padded by odd reflection about its
 * ends so that a slope there goes on. Returns the stretch only.
 */
export function zeroLagLowPass(
  force: Float64Array,
  from: number,
  to: number,
  section: Section,
): Float64Array {
  const n = to - from
  const pad = Math.max(0, Math.min(60, n - 1))
  const y = new Float64Array(n + 2 * pad)
  for (let i = 0; i < n; i++) y[pad + i] = force[from + i]
  for (let k = 1; k <= pad; k++) {
    y[pad - k] = 2 * force[from] - force[from + k]
    y[pad + n - 1 + k] = 2 * force[to - 1] - force[to - 1 - k]
  }
  pass(y, section, false)
  pass(y, section, true)
  return y.subarray(pad, pad + n)
}
