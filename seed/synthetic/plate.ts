import type { PlateOptions } from './options.ts'
import type { Random } from './random.ts'

/**
 * What a plate reads of a true force, sample by sample: gain, offset, drift, ringing from `touchS` on, white and
 * slow noise, and the converter's step. `force` is changed in place.
 */
export function measure(
  force: Float64Array,
  sampleRateHz: number,
  touchS: number,
  plate: PlateOptions,
  random: Random,
): void {
  const keep = Math.exp(-1 / (sampleRateHz * plate.slowNoiseTimeS))
  const innovation = plate.slowNoiseN * Math.sqrt(1 - keep ** 2)
  const omega = 2 * Math.PI * plate.ringingHz
  let slow = plate.slowNoiseN > 0 ? plate.slowNoiseN * random.normal() : 0
  for (let i = 0; i < force.length; i++) {
    const timeS = i / sampleRateHz
    const since = timeS - touchS
    let reading = (force[i] ?? 0) * (1 + plate.gainError) + plate.offsetN + plate.driftNPerS * timeS
    if (plate.ringingN > 0 && since > 0)
      reading += plate.ringingN * Math.exp(-since / plate.ringingDecayS) * Math.sin(omega * since)
    if (plate.whiteNoiseN > 0) reading += plate.whiteNoiseN * random.normal()
    if (plate.slowNoiseN > 0) {
      reading += slow
      slow = keep * slow + innovation * random.normal()
    }
    force[i] = plate.stepN > 0 ? Math.round(reading / plate.stepN) * plate.stepN : reading
  }
}
