import { area } from 'd3'
import type { Phase } from '../../../shared/mechanics/types.ts'
import { decimate } from './decimate.ts'
import { valueAt } from './value-at.ts'

/** One stretch of the Impulse ledger on the trace. */
export interface TracePhase {
  phase: Phase
  startS: number
  endS: number
  /** N·s */
  netImpulse: number
}

export interface PhaseShape {
  phase: Phase
  netImpulse: number
  /** Closed paths between the force and the weight: above it the push lifts or slows, below it lets sink. */
  above: string
  below: string
  /** Where the figure stands; null where the areas above and below cancel, so that no area shows it. */
  label: { x: number; y: number; room: number; height: number } | null
}

export interface TraceScales {
  time: (timeS: number) => number
  force: (forceN: number) => number
}

/** Below this share of one-sidedness the net impulse is no area that an eye could see. */
const oneSided = 0.8

/** The area between the force and the weight of one phase, in the chart's own pixels. */
export function phaseShape(
  phase: TracePhase,
  force: Float64Array,
  sampleRateHz: number,
  weightN: number,
  scales: TraceScales,
): PhaseShape {
  const points = outline(phase, force, sampleRateHz, scales)
  const draw = (clip: (forceN: number) => number) =>
    area<[number, number]>()
      .x(([timeS]) => scales.time(timeS))
      .y0(scales.force(weightN))
      .y1(([, forceN]) => scales.force(clip(forceN)))(points) ?? ''
  return {
    phase: phase.phase,
    netImpulse: phase.netImpulse,
    above: draw((forceN) => Math.max(forceN, weightN)),
    below: draw((forceN) => Math.min(forceN, weightN)),
    label: labelPlace(phase, points, weightN, scales),
  }
}

function outline(
  phase: TracePhase,
  force: Float64Array,
  rate: number,
  scales: TraceScales,
): [number, number][] {
  const columns = Math.max(1, Math.round(scales.time(phase.endS) - scales.time(phase.startS)))
  const inner = decimate(force, Math.ceil(phase.startS * rate), Math.floor(phase.endS * rate), columns)
  return [
    [phase.startS, valueAt(force, rate, phase.startS)],
    ...inner.map((i): [number, number] => [i / rate, force[i]!]),
    [phase.endS, valueAt(force, rate, phase.endS)],
  ]
}

function labelPlace(
  phase: TracePhase,
  points: [number, number][],
  weightN: number,
  scales: TraceScales,
): PhaseShape['label'] {
  let signed = 0
  let whole = 0
  let moment = 0
  for (let i = 1; i < points.length; i++) {
    const [t0, f0] = points[i - 1]!
    const [t1, f1] = points[i]!
    const part = ((f0 + f1) / 2 - weightN) * (t1 - t0)
    signed += part
    whole += Math.abs(part)
    moment += (Math.abs(part) * (t0 + t1)) / 2
  }
  if (whole === 0 || Math.abs(signed) / whole < oneSided) return null
  const centreS = moment / whole
  const [, forceN] = points.reduce((near, point) =>
    Math.abs(point[0] - centreS) < Math.abs(near[0] - centreS) ? point : near,
  )
  const y = scales.force(weightN + (forceN - weightN) * 0.35)
  return {
    x: scales.time(centreS),
    y,
    room: scales.time(phase.endS) - scales.time(phase.startS),
    height: Math.abs(scales.force(forceN) - scales.force(weightN)),
  }
}
