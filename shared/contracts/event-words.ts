import { eventOrder, type Misplaced } from '../mechanics/events/event-order.ts'
import type { EventName } from '../mechanics/types.ts'

/** The events of a trial in the order in which they come, as people call them. */
export const eventWords: Record<EventName, string> = {
  onset: 'onset',
  arrival: 'arrival',
  minimumForce: 'least force',
  minimumVelocity: 'fastest down',
  zeroVelocity: 'lowest',
  takeoff: 'takeoff',
  touchdown: 'touchdown',
  landingPeak: 'landing peak',
  landingZeroVelocity: 'landing’s lowest',
  still: 'still',
}

/** Why a moved event cannot stand where it was put, and where it can. */
export function misplacedWords(misplaced: Misplaced): string {
  const event = eventWords[misplaced.event]
  const Event = event.charAt(0).toUpperCase() + event.slice(1)
  if (misplaced.problem === 'outside')
    return `${Event} must lie within the recording, from 0 to ${misplaced.endS.toFixed(3)} s.`
  const order = misplaced.problem === 'not-after' ? 'after' : 'before'
  return `${Event} must come ${order} ${eventWords[misplaced.other]}, at ${misplaced.otherS.toFixed(3)} s.`
}

/** Names of events in a sentence: "onset, takeoff and still". */
export function eventList(names: readonly EventName[]): string {
  const words = eventOrder.filter((name) => names.includes(name)).map((name) => eventWords[name])
  return words.length < 2 ? words.join('') : `${words.slice(0, -1).join(', ')} and ${words.at(-1)}`
}
