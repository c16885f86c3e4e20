import { type Books, itemOf, scheduleOf, subscriptionOf, tell } from './books.ts'
import { listOf, textOf, wholeOf, type Form } from './form-body.ts'
import { invalidRequest } from './service-error.ts'
import type { Phase, Schedule } from './shapes.ts'

/** A schedule over a running subscription; its first phase is the present period. */
export function createSchedule(books: Books, form: Form): Schedule {
  const subscription = subscriptionOf(books, textOf(form, 'from_subscription') ?? '')
  if (subscription.schedule)
    throw invalidRequest('The subscription already has a schedule.', 'from_subscription')
  const { price, quantity, current_period_start, current_period_end } = itemOf(subscription)
  const schedule: Schedule = {
    id: books.id('sub_sched'),
    object: 'subscription_schedule',
    customer: subscription.customer,
    subscription: subscription.id,
    status: 'active',
    end_behavior: 'release',
    phases: [
      {
        start_date: current_period_start,
        end_date: current_period_end,
        items: [{ price: price.id, quantity }],
      },
    ],
  }
  books.state.schedules[schedule.id] = schedule
  subscription.schedule = schedule.id
  tell(books, 'subscription_schedule.created', schedule)
  return schedule
}

/** Sets the phases anew; the first one has to be the present. */
export function updateSchedule(books: Books, id: string, form: Form): Schedule {
  const schedule = scheduleOf(books, id)
  if (schedule.status !== 'active') throw invalidRequest('The schedule is not active.')
  const phases = listOf(form, 'phases').map(readPhase)
  const first = phases[0]
  if (!first || first.start_date !== schedule.phases[0]?.start_date) {
    throw invalidRequest('The first phase has to begin where the present one does.', 'phases[0][start_date]')
  }
  // A phase begins where the one before it ends.
  phases.forEach((phase, i) => {
    const before = phases[i - 1]
    if (before?.end_date) phase.start_date = before.end_date
  })
  schedule.phases = phases
  tell(books, 'subscription_schedule.updated', schedule)
  return schedule
}

function readPhase(form: Form): Phase {
  const items = listOf(form, 'items').map((item) => ({
    price: textOf(item, 'price') ?? '',
    quantity: wholeOf(item, 'quantity') ?? 1,
  }))
  return { start_date: wholeOf(form, 'start_date') ?? 0, end_date: wholeOf(form, 'end_date') ?? null, items }
}

/** Lets go of the subscription, which goes on as it is. */
export function releaseSchedule(books: Books, id: string): Schedule {
  const schedule = scheduleOf(books, id)
  if (schedule.status !== 'active') throw invalidRequest('The schedule is not active.')
  if (schedule.subscription) subscriptionOf(books, schedule.subscription).schedule = null
  Object.assign(schedule, { status: 'released', subscription: null })
  tell(books, 'subscription_schedule.released', schedule)
  return schedule
}
