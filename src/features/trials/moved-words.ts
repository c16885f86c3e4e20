import type { EventMove } from '../../../shared/contracts/moved-events.ts'
import { eventWords } from '../../../shared/contracts/event-words.ts'
import { eventOrder, type MovedEvents } from '../../../shared/mechanics/events/event-order.ts'
import type { EventName } from '../../../shared/mechanics/types.ts'

/** An instant as moves are told: to a tenth of a millisecond, less than a sample of any plate. */
export const instantWords = (timeS: number) => `${timeS.toFixed(4)} s`

/** "takeoff from 1.6004 s to 1.6120 s", one for each event that a move changed. */
export function moveLines({ events, stood }: Pick<EventMove, 'events' | 'stood'>): string[] {
  return eventOrder.flatMap((name) => {
    const from = stood[name]
    return from === undefined ? [] : [lineOf(name, from, events[name])]
  })
}

function lineOf(name: EventName, from: number | null, to: number | undefined): string {
  const stood = from === null ? '' : ` from ${instantWords(from)}`
  return `${eventWords[name]}${stood} ${to === undefined ? 'back to automatic' : `to ${instantWords(to)}`}`
}

/** "takeoff at 1.6120 s, still at 3.1000 s", or that none is moved. */
export function movedWords(events: MovedEvents): string {
  const words = eventOrder.flatMap((name) => {
    const timeS = events[name]
    return timeS === undefined ? [] : [`${eventWords[name]} at ${instantWords(timeS)}`]
  })
  return words.length === 0 ? 'all automatic' : words.join(', ')
}
