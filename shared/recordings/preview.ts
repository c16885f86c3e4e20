import type { Recording } from '../mechanics/types.ts'
import { totalForce } from './total-force.ts'

/** A recording's total force in few points, for a sheet's sparkline. */
export interface Preview {
  /** Seconds from the first sample, to 1 ms. */
  timeS: number[]
  /** Whole newtons. */
  forceN: number[]
}

const POINTS = 96

/**
 * The total force in about 96 points: the smallest and the greatest sample of each of 48 stretches, in the order
 * they come, so that no peak and no flight is lost.
 */
export function previewOf(recording: Recording): Preview {
  const force = totalForce(recording)
  const kept = force.length <= POINTS ? Array.from(force.keys()) : extremes(force, POINTS / 2)
  return {
    timeS: kept.map((i) => Math.round((i / recording.sampleRateHz) * 1000) / 1000),
    forceN: kept.map((i) => Math.round(force[i] ?? 0) + 0),
  }
}

function extremes(force: Float64Array, stretches: number): number[] {
  const kept: number[] = []
  for (let k = 0; k < stretches; k++) {
    const start = Math.floor((k * force.length) / stretches)
    const end = Math.floor(((k + 1) * force.length) / stretches)
    let [least, greatest] = [start, start]
    for (let i = start + 1; i < end; i++) {
      if ((force[i] ?? 0) < (force[least] ?? 0)) least = i
      if ((force[i] ?? 0) > (force[greatest] ?? 0)) greatest = i
    }
    if (least !== greatest) kept.push(Math.min(least, greatest))
    kept.push(Math.max(least, greatest))
  }
  return kept
}
