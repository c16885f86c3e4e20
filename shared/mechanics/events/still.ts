import type { Settings } from '../settings.ts'
import { meanAround, type RunningSums } from '../signal/running-mean.ts'

/**
 * First position (samples) after `from` at which the running mean of the force comes within ±`band` of the weight and
 * stays there for `hold` samples; `null` where the record ends before. Placed between samples by a straight line.
 */
export function comesToStay(
  sums: RunningSums,
  weight: number,
  band: number,
  from: number,
  hold: number,
  half: number,
): number | null {
  const { sums: running, reference, length } = sums
  const width = 2 * half + 1
  const target = (weight - reference) * width
  const within = band * width
  const start = Math.ceil(from)
  let since = -1
  for (let i = start; i < length; i++) {
    // Inside the record the running mean is one subtraction; at its ends it is taken over what is there.
    const inside = i >= half && i + half < length
    const distance = inside
      ? Math.abs(running[i + half + 1] - running[i - half] - target)
      : Math.abs(meanAround(sums, i, half) - weight) * width
    if (!(distance <= within)) since = -1
    else if (since < 0) since = i
    if (since >= 0 && i - since >= hold) return placed(sums, weight, band, since, half)
  }
  return null
}

function placed(sums: RunningSums, weight: number, band: number, i: number, half: number): number {
  const here = Math.abs(meanAround(sums, i, half) - weight)
  const before = Math.abs(meanAround(sums, i - 1, half) - weight)
  return before > band ? i - (band - here) / (before - here) : i
}

/**
 * The beginning of the first second of quiet stance after landing: the mirror image of the onset, `onsetLeadS` after
 * the force has come back for good into the onset's band about the weight.
 */
export function findStill(
  sums: RunningSums,
  weight: number,
  touchdown: number,
  dt: number,
  settings: Settings,
): number | null {
  const half = Math.max(1, Math.round(settings.onsetSmoothingS / dt / 2))
  const hold = Math.floor(settings.stillWindowS / dt)
  const back = comesToStay(sums, weight, settings.onsetFraction * weight, touchdown, hold, half)
  return back === null ? null : back + settings.onsetLeadS / dt
}
