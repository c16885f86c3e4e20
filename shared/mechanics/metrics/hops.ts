import type { PlacedContact } from '../events/contacts.ts'
import type { Quantity } from '../uncertainty/budget.ts'
import { isRebound, measureContact, type MeasuredContact } from './contacts.ts'
import { crossingTime } from './event-times.ts'
import { recorderDelay } from './recorder-delay.ts'
import { miss, put, reasons, type Measured } from './measured.ts'
import type { TrialModel } from './trial-model.ts'

/** A hop, and whether the published rule takes it into the score. */
export interface Hop extends MeasuredContact {
  counted: boolean
}

/**
 * The contacts of a series, the touchdown after one being the next one's; their errors are alike. The first ten short
 * ones count.
 */
export function measureHops(model: TrialModel, contacts: readonly PlacedContact[]): Hop[] {
  const { contactsConsidered } = model.settings
  const { budget } = model
  const alike = budget.input(0, 1)
  const recorder = recorderDelay(model)
  let touchdown = contacts.length > 0 ? crossingTime(model, contacts[0].touchdown, alike) : null
  return contacts.map((placed, i) => {
    const isLast = i === contacts.length - 1
    const landing = crossingTime(model, placed.landing, isLast ? undefined : alike)
    const takeoff = crossingTime(model, placed.takeoff)
    const measured = measureContact(model, placed, touchdown ?? landing, takeoff, landing, recorder)
    touchdown = landing
    return { ...measured, counted: i < contactsConsidered && isRebound(model, measured) }
  })
}

function meanOf({ budget }: Pick<TrialModel, 'budget'>, quantities: readonly Quantity[]): Quantity {
  const share = 1 / quantities.length
  const sum = quantities.reduce((total, { value }) => total + value, 0)
  return budget.linear(
    sum * share,
    quantities.map((quantity) => [share, quantity] as const),
  )
}

/** Count, mean contact time, and the mean RSI of the best hops (Harper, Hobbs, Moore 2011). */
export function hopFigures(
  model: Pick<TrialModel, 'budget' | 'settings'>,
  hops: readonly Hop[],
  into: Measured,
): void {
  const { budget, settings } = model
  put(into, 'hopCount', budget.exact(hops.length))
  const counted = hops.filter((hop) => hop.counted)
  if (counted.length === 0) return miss(into, ['rsiBestFive', 'contactTimeMean'], reasons.noHops)
  const times = counted.map(({ contactTime }) => contactTime)
  put(into, 'contactTimeMean', meanOf(model, times))
  if (counted.length < settings.bestContacts) return miss(into, ['rsiBestFive'], reasons.noHops)
  const best = counted.map(({ rsi }) => rsi).sort((a, b) => b.value - a.value)
  put(into, 'rsiBestFive', meanOf(model, best.slice(0, settings.bestContacts)))
}
