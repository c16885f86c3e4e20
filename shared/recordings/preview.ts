import type { Recording } from '../mechanics/types.ts'
import { totalForce } from './total-force.ts'

/** A recording's total force in few points, for a sheet's sparkline. */
export interface Preview {
  /** Seconds from the first sample, to 1 ms. */
  timeS: number[]
  /** Whole newtons. */
  forceN: number[]
}

const POINTS = 240

/**
 * The total force in 240 points: of each of 240 stretches the sample farthest from the one kept before, so that no
 * peak and no flight is lost and a drawn jump runs smoothly.
 */
export function previewOf(recording: Recording): Preview {
  const force = totalForce(recording)
  const kept = force.length <= POINTS ? Array.from(force.keys()) : farthest(force)
  return {
    timeS: kept.map((i) => Math.round((i / recording.sampleRateHz) * 1000) / 1000),
    forceN: kept.map((i) => Math.round(force[i] ?? 0) + 0),
  }
}

function farthest(force: Float64Array): number[] {
  const kept: number[] = []
  let before = force[0] ?? 0
  for (let k = 0; k < POINTS; k++) {
    const start = Math.floor((k * force.length) / POINTS)
    const end = Math.floor(((k + 1) * force.length) / POINTS)
    let chosen = start
    for (let i = start + 1; i < end; i++) {
      if (Math.abs((force[i] ?? 0) - before) > Math.abs((force[chosen] ?? 0) - before)) chosen = i
    }
    before = force[chosen] ?? 0
    kept.push(chosen)
  }
  return kept
}
