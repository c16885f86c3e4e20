import { getEvents } from '../../../shared/contracts/events.ts'
import { handled, implement, type Route } from '../../http/implement.ts'
import { type ClubEvents, createClubEvents } from './club-events.ts'
import { streamEvents } from './event-stream.ts'

/** One connection for events a process, whichever of its requests asks first. */
const eventsOf = new WeakMap<object, ClubEvents>()

export const eventRoutes: Route[] = [
  implement(getEvents, async ({ deps, ctx, res }) => {
    const events = eventsOf.get(deps) ?? createClubEvents(deps)
    eventsOf.set(deps, events)
    await streamEvents(events, ctx, res)
    return handled
  }),
]
