import type { Trial } from '../../../../shared/contracts/trials.ts'
import type { OverlaidTrial } from '../../../api/trials/get-overlaid.ts'
import type { TraceOverlay } from '../../../charts/trial-trace/trace-data.ts'
import { traceDataOf } from '../trace-data-of.ts'

/** The event at which trials are laid over one another. */
export type AlignAt = 'takeoff' | 'onset'

/** The letters of the trials laid over, in their order. */
export const overlayLetter = (i: number): string => String.fromCharCode('A'.charCodeAt(0) + i)

/** A trial shifted onto the time axis of another; null where one of them has no such event, or no force to draw. */
export function overlayOf(
  { trial, samples }: OverlaidTrial,
  onto: Pick<Trial, 'analysis'>,
  alignAt: AlignAt,
  label: string,
): TraceOverlay | null {
  const here = onto.analysis?.events[alignAt]
  const there = trial.analysis?.events[alignAt]
  const data = traceDataOf(trial, samples)
  if (!here || !there || !data) return null
  const { sampleRateHz, total, momentum } = data
  return { key: trial.id, label, sampleRateHz, startS: here.timeS - there.timeS, total, momentum }
}
