/** How a charge of a card ends: paid, refused at once, refused when it is charged later, or after a second step. */
export type CardOutcome = 'paid' | 'declined' | 'declined-later' | 'second-step'

/** The hosted service's published test numbers (docs.stripe.com/testing), the few that this product needs. */
const outcomes: Record<string, { outcome: CardOutcome; reason: string }> = {
  '4242424242424242': { outcome: 'paid', reason: '' },
  '4000000000000002': { outcome: 'declined', reason: 'generic_decline' },
  '4000000000009995': { outcome: 'declined', reason: 'insufficient_funds' },
  '4000000000000341': { outcome: 'declined-later', reason: 'generic_decline' },
  '4000002500003155': { outcome: 'second-step', reason: '' },
}

export const testCards: [number: string, words: string][] = [
  ['4242 4242 4242 4242', 'is paid'],
  ['4000 0025 0000 3155', 'asks for a second step'],
  ['4000 0000 0000 0002', 'is declined'],
  ['4000 0000 0000 9995', 'is declined: not enough money'],
  ['4000 0000 0000 0341', 'is taken, and declined when it is charged again'],
]

export const plainNumber = (number: string) => number.replace(/\s/gu, '')

/** Null for a number that is none of the test cards. */
export const outcomeOf = (number: string) => outcomes[plainNumber(number)] ?? null
