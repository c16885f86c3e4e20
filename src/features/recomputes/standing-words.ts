import type { Standing } from '../../api/recomputes/get-standing.ts'
import { counted } from '../../lib/counted.ts'

/** "34 of 120 analyses were made with other settings." */
export function staleSentence({ stale, total, otherEngine, otherSettings, otherPlates }: Standing): string {
  const reasons = [
    otherEngine > 0 && 'an engine before this one',
    otherSettings > 0 && 'other settings',
    otherPlates > 0 && 'another plate calibration or place',
  ].filter((reason) => reason !== false)
  const last = reasons.pop() ?? ''
  const list = reasons.length > 0 ? `${reasons.join(', ')} or ${last}` : last
  return `${stale} of ${counted(total, 'analysis').replace('analysiss', 'analyses')} ${stale === 1 ? 'was' : 'were'} made with ${list}.`
}
