import type { TracePhase } from './phase-shapes.ts'

export interface TraceChannel {
  key: 'left' | 'right'
  label: string
  values: Float64Array
}

export interface TraceEvent {
  key: string
  label: string
  timeS: number
}

/** Everything that the trace of one trial is drawn from. Seconds from the first sample, newtons, kg·m/s. */
export interface TraceData {
  sampleRateHz: number
  durationS: number
  /** Force of all plates together. */
  total: Float64Array
  /** One a foot; empty with one plate. */
  feet: TraceChannel[]
  weight: { valueN: number; label: string } | null
  momentum: Float64Array | null
  phases: TracePhase[]
  events: TraceEvent[]
}
