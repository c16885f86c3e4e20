import type { TracePhase } from './phase-shapes.ts'

/** What is drawn before the movement and after it when the view is on the jump, seconds. */
const leadS = 0.5

/** The stretch of the jump with a lead on either side, or the whole recording where there is no jump. */
export function jumpView(phases: readonly TracePhase[], durationS: number): { startS: number; endS: number } {
  const first = phases[0]
  const last = phases[phases.length - 1]
  if (!first || !last) return { startS: 0, endS: durationS }
  return { startS: Math.max(0, first.startS - leadS), endS: Math.min(durationS, last.endS + leadS) }
}
