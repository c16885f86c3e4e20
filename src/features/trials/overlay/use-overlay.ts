import { useMemo, useState } from 'react'
import type { Trial } from '../../../../shared/contracts/trials.ts'
import { useOverlaid, type OverlaidTrial } from '../../../api/trials/get-overlaid.ts'
import { overlayLetter, overlayOf, type AlignAt } from './overlay-of.ts'

/** The trials that a person laid over this one's trace. */
export function useOverlay(trial: Trial) {
  const [trialIds, setTrialIds] = useState<string[]>([])
  const [alignAt, setAlignAt] = useState<AlignAt>('takeoff')
  const queries = useOverlaid(trialIds)
  const laid = useSameList(queries.flatMap(({ data }) => (data ? [data] : [])))
  const aligned = useMemo(
    () => laid.map((other, i) => overlayOf(other, trial, alignAt, overlayLetter(i))),
    [laid, trial, alignAt],
  )
  return {
    trialIds,
    laid,
    alignAt,
    alignTo: setAlignAt,
    lay: (trialId: string) => trialId !== '' && setTrialIds([...trialIds, trialId]),
    takeOff: (trialId: string) => setTrialIds(trialIds.filter((id) => id !== trialId)),
    /** As the trace draws them. */
    overlays: useMemo(() => aligned.filter((overlay) => overlay !== null), [aligned]),
    /** Letters of those that cannot be aligned. */
    unaligned: aligned.flatMap((overlay, i) => (overlay === null ? [overlayLetter(i)] : [])),
    failed: queries.some(({ isError }) => isError),
  }
}
export type Overlay = ReturnType<typeof useOverlay>

/** The list as it was before, as long as it holds the same trials: what is drawn of it need not be drawn anew. */
function useSameList(now: OverlaidTrial[]): OverlaidTrial[] {
  const [kept, setKept] = useState(now)
  const same = now.length === kept.length && now.every((one, i) => one === kept[i])
  if (!same) setKept(now)
  return same ? kept : now
}
