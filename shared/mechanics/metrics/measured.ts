import type { MetricKey } from '../catalogue.ts'
import type { Quantity } from '../uncertainty/budget.ts'

/** What became of a metric: a quantity, one without an honest uncertainty, or none. */
export type Outcome = { quantity: Quantity; withoutU?: string } | { missing: string }

/** Outcomes by key; a metric that does not apply is not there. */
export type Measured = Map<MetricKey, Outcome>

/** Reasons that several metrics share. */
export const reasons = {
  noTouchdown: 'No touchdown was found: the athlete did not come back onto the plates within a flight.',
  noLandingEnd: 'The velocity did not come back to zero before the recording ended.',
  noStill: 'The athlete did not stand still for a second after landing before the recording ended.',
  noTurn: 'The velocity did not come to zero during the contact: the fall was not turned into a jump.',
  noHops: 'Too few hops count: the feet were on the ground for too long, or the series is too short.',
  notWeighed: 'The athlete did not stand still long enough to be weighed.',
  noWeight:
    'The athlete did not stand still after the landing, and no body mass is recorded: there is no weight to go by.',
  noStance: 'No quiet stance was found before the first jump.',
  noDip: 'No countermovement was found: the body did not move down before the push.',
} as const

/** Enters a quantity as measured with its uncertainty. */
export function put(into: Measured, key: MetricKey, quantity: Quantity): void {
  into.set(key, { quantity })
}

/** Enters the same reason for each of the keys. */
export function miss(into: Measured, keys: readonly MetricKey[], reason: string): void {
  for (const key of keys) into.set(key, { missing: reason })
}
