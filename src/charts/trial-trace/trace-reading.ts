import { formatNumber } from '../../lib/format-figure.ts'
import { formatSigned } from '../../lib/format-signed.ts'
import type { TraceData } from './trace-data.ts'
import { valueAt } from './value-at.ts'

export interface TraceReading {
  timeS: number
  values: { label: string; text: string }[]
}

/** What the trace says at an instant: force together and of each foot, and the momentum. */
export function readTrace(data: TraceData, timeS: number): TraceReading {
  const at = (values: Float64Array) => valueAt(values, data.sampleRateHz, timeS)
  return {
    timeS,
    values: [
      { label: data.feet.length > 0 ? 'both feet' : 'force', text: `${formatNumber(at(data.total), 0)} N` },
      ...data.feet.map((foot) => ({ label: foot.label, text: `${formatNumber(at(foot.values), 0)} N` })),
      ...(data.momentum ? [{ label: 'momentum', text: `${formatSigned(at(data.momentum), 1)} kg·m/s` }] : []),
    ],
  }
}

/** One step of the arrow keys, seconds. With Shift it is one sample. */
const stepS = 0.01

/**
 * Where a key takes the cursor: arrows by 10 ms (with Shift by one sample), Page keys from event to event, Home
 * and End to the view's ends. null for a key that is not ours.
 */
export function moveCursor(
  key: string,
  shift: boolean,
  timeS: number,
  data: Pick<TraceData, 'events' | 'sampleRateHz'>,
  view: { startS: number; endS: number },
): number | null {
  const step = shift ? 1 / data.sampleRateHz : stepS
  const times = data.events.map((event) => event.timeS).sort((a, b) => a - b)
  const within = (wanted: number) => Math.min(Math.max(wanted, view.startS), view.endS)
  switch (key) {
    case 'ArrowRight':
    case 'ArrowUp':
      return within(timeS + step)
    case 'ArrowLeft':
    case 'ArrowDown':
      return within(timeS - step)
    case 'PageUp':
      return within(times.find((time) => time > timeS + 1e-6) ?? view.endS)
    case 'PageDown':
      return within(times.reverse().find((time) => time < timeS - 1e-6) ?? view.startS)
    case 'Home':
      return view.startS
    case 'End':
      return view.endS
    default:
      return null
  }
}
