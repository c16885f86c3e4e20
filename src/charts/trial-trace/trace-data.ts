import type { EventName } from '../../../shared/mechanics/types.ts'
import type { TracePhase } from './phase-shapes.ts'

export interface TraceChannel {
  key: 'left' | 'right'
  label: string
  values: Float64Array
}

export interface TraceEvent {
  key: EventName
  label: string
  timeS: number
  /** Set by a person, not by the engine. */
  adjusted?: boolean
}

/** Another trial laid over this one, shifted so that the two are aligned. */
export interface TraceOverlay {
  key: string
  /** One letter, which stands at the line's end and in the list beside. */
  label: string
  sampleRateHz: number
  /** Time of its first sample on this trial's time axis, seconds. */
  startS: number
  total: Float64Array
  momentum: Float64Array | null
}

/** A stretch of time that is marked as a whole. */
export interface TraceSpan {
  startS: number
  endS: number
  label: string
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
  overlays: TraceOverlay[]
  span?: TraceSpan
}
