import type { SubscriptionItem } from './shapes.ts'
import { discounted, type LineDraft } from './invoicing.ts'
import type { Subscription } from './shapes.ts'

/**
 * What a change of seats costs for the rest of the period, by the second: the unused part of the old number is
 * credited, the same part of the new one is charged.
 */
export function prorate(
  { price, quantity, current_period_start: start, current_period_end: end }: SubscriptionItem,
  next: number,
  atS: number,
  discount: Subscription['discount'],
): LineDraft[] {
  const left = Math.min(1, Math.max(0, (end - atS) / (end - start)))
  const part = (seats: number) => Math.round(discounted(price.unit_amount * seats, discount) * left)
  return [
    { description: `Unused time on ${quantity} seats`, amount: -part(quantity), quantity },
    { description: `Remaining time on ${next} seats`, amount: part(next), quantity: next },
  ]
}
