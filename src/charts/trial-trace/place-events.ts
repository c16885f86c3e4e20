import { nameTiers } from '../name-tiers.ts'
import type { TraceEvent } from './trace-data.ts'
import type { PlacedEvent } from './trace-events.tsx'

/** About what a letter of the events' names takes, pixels. */
const letterPx = 6.4

/** About what an event's name takes, pixels. */
export const eventNameWidth = ({ label, adjusted }: TraceEvent): number =>
  (label.length + (adjusted ? ' (adjusted)'.length : 0)) * letterPx

/** The events inside the view, each with its place and the tier on which its name has room. */
export function placeEvents(
  events: readonly TraceEvent[],
  view: { startS: number; endS: number },
  x: (timeS: number) => number,
): { placed: PlacedEvent[]; tiers: number } {
  const inView = events.filter((event) => event.timeS >= view.startS && event.timeS <= view.endS)
  const tiers = nameTiers(
    inView.map((event) => ({ x: x(event.timeS), width: eventNameWidth(event) })),
    6,
  )
  return {
    placed: inView.map((event, i) => ({ ...event, x: x(event.timeS), tier: tiers[i]! })),
    tiers: Math.max(1, ...tiers.map((tier) => tier + 1)),
  }
}
