import { type Books, checkoutOf, customerOf, priceOf, tell } from './books.ts'
import { outcomeOf } from './cards.ts'
import { keepCard } from './customers.ts'
import { groupOf, listOf, textOf, textsByName, wholeOf, type Form } from './form-body.ts'
import { invalidRequest } from './service-error.ts'
import type { CheckoutSession } from './shapes.ts'
import { startSubscription } from './subscriptions.ts'

export function createCheckout(books: Books, form: Form): CheckoutSession {
  const customer = customerOf(books, textOf(form, 'customer') ?? '').id
  const [line] = listOf(form, 'line_items')
  const quantity = line && wholeOf(line, 'quantity')
  if (textOf(form, 'mode') !== 'subscription')
    throw invalidRequest('Only mode=subscription is known here.', 'mode')
  if (!line || !quantity || quantity < 1) throw invalidRequest('Invalid line_items', 'line_items')
  const id = books.id('cs_test')
  const session: CheckoutSession = {
    id,
    object: 'checkout.session',
    customer,
    mode: 'subscription',
    status: 'open',
    url: `${books.baseUrl()}/checkout/${id}`,
    success_url: textOf(form, 'success_url') ?? '',
    cancel_url: textOf(form, 'cancel_url') ?? '',
    subscription: null,
    created: books.now(),
    price: priceOf(books, textOf(line, 'price') ?? '').id,
    quantity,
    metadata: textsByName(groupOf(groupOf(form, 'subscription_data'), 'metadata')),
    waiting: null,
  }
  return (books.state.sessions[id] = session)
}

/** What the page says after a try: paid, a second step to take, or why not. */
export type CheckoutStep = { step: 'done' } | { step: 'second' } | { step: 'again'; problem: string }

export function giveCard(
  books: Books,
  id: string,
  given: { number: string; promotion: string; taxId: string },
): CheckoutStep {
  const session = checkoutOf(books, id)
  if (session.status !== 'open') return { step: 'again', problem: 'This checkout is not open any more.' }
  const found = outcomeOf(given.number)
  if (!found) return { step: 'again', problem: 'This is none of the test cards.' }
  if (given.promotion && !promotionOf(books, given.promotion)) {
    return { step: 'again', problem: 'There is no such promotion code.' }
  }
  if (found.outcome === 'declined')
    return { step: 'again', problem: `The card was declined (${found.reason}).` }
  if (found.outcome === 'second-step') {
    session.waiting = given
    return { step: 'second' }
  }
  complete(books, session, given)
  return { step: 'done' }
}

/** The end of the second step: confirmed by the card's holder, or refused. */
export function takeSecondStep(books: Books, id: string, confirmed: boolean): CheckoutStep {
  const session = checkoutOf(books, id)
  const { waiting } = session
  if (!waiting) return { step: 'again', problem: 'There is no second step to take.' }
  session.waiting = null
  if (!confirmed) return { step: 'again', problem: 'The second step was refused; nothing was charged.' }
  complete(books, session, waiting)
  return { step: 'done' }
}

function complete(
  books: Books,
  session: CheckoutSession,
  { number, promotion, taxId }: { number: string; promotion: string; taxId: string },
): void {
  const code = promotionOf(books, promotion)
  if (taxId) customerOf(books, session.customer).tax_ids.push(taxId)
  keepCard(books, session.customer, number)
  const discount = code ? { percentOff: code.percentOff, once: code.once } : null
  const subscription = startSubscription(books, session, discount)
  Object.assign(session, { status: 'complete', subscription: subscription.id })
  tell(books, 'checkout.session.completed', session)
}

const promotionOf = ({ state }: Books, code: string) =>
  state.promotions.find((one) => one.code === code.trim().toUpperCase()) ?? null
