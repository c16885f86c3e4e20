import type { PlateOptions } from './options.ts'
import type { Random } from './random.ts'

/** After so many decay times a touchdown's ringing is over for any purpose. */
const RUNG_OUT = 40

/** Ringing that every touch of the plate sets off. */
function ring(reading: Float64Array, sampleRateHz: number, touchesS: readonly number[], plate: PlateOptions) {
  const omega = 2 * Math.PI * plate.ringingHz
  for (const touchS of touchesS) {
    const last = Math.min(reading.length - 1, (touchS + RUNG_OUT * plate.ringingDecayS) * sampleRateHz)
    for (let i = Math.max(0, Math.ceil(touchS * sampleRateHz)); i <= last; i++) {
      const since = i / sampleRateHz - touchS
      reading[i] += plate.ringingN * Math.exp(-since / plate.ringingDecayS) * Math.sin(omega * since)
    }
  }
}

/**
 * The recorder's low-pass: a second-order Butterworth by the bilinear transform with the cut-off pre-warped
 * (from memory), forwards only as a recorder filters, and settled on the first reading. It delays by about √2/ω.
 */
function lowPass(reading: Float64Array, sampleRateHz: number, cutoffHz: number) {
  const k = Math.tan((Math.PI * cutoffHz) / sampleRateHz)
  const norm = 1 / (1 + Math.SQRT2 * k + k * k)
  const [b, a1, a2] = [k * k * norm, 2 * (k * k - 1) * norm, (1 - Math.SQRT2 * k + k * k) * norm]
  let [x1, x2] = [reading[0] ?? 0, reading[0] ?? 0]
  let [y1, y2] = [x1, x1]
  for (let i = 0; i < reading.length; i++) {
    const x = reading[i] ?? 0
    const y = b * (x + 2 * x1 + x2) - a1 * y1 - a2 * y2
    ;[x2, x1, y2, y1] = [x1, x, y1, y]
    reading[i] = y
  }
}

/**
 * What a plate reads of a true force, sample by sample: gain, offset, drift, ringing from each touch on, white and
 * slow noise, the recorder's low-pass, and the converter's step. `force` is changed in place; its first sample is
 * at time 0 of `touchesS`.
 */
export function measure(
  force: Float64Array,
  sampleRateHz: number,
  touchesS: readonly number[],
  plate: PlateOptions,
  random: Random,
): void {
  const keep = Math.exp(-1 / (sampleRateHz * plate.slowNoiseTimeS))
  const innovation = plate.slowNoiseN * Math.sqrt(1 - keep ** 2)
  let slow = plate.slowNoiseN > 0 ? plate.slowNoiseN * random.normal() : 0
  for (let i = 0; i < force.length; i++) {
    const timeS = i / sampleRateHz
    let reading = (force[i] ?? 0) * (1 + plate.gainError) + plate.offsetN + plate.driftNPerS * timeS
    if (plate.whiteNoiseN > 0) reading += plate.whiteNoiseN * random.normal()
    if (plate.slowNoiseN > 0) {
      reading += slow
      slow = keep * slow + innovation * random.normal()
    }
    force[i] = reading
  }
  if (plate.ringingN > 0) ring(force, sampleRateHz, touchesS, plate)
  if (plate.lowPassHz > 0) lowPass(force, sampleRateHz, plate.lowPassHz)
  if (plate.stepN > 0)
    for (let i = 0; i < force.length; i++) force[i] = Math.round((force[i] ?? 0) / plate.stepN) * plate.stepN
}
