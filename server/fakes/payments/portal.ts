import { type Books, customerOf, invoiceOf } from './books.ts'
import { outcomeOf } from './cards.ts'
import { keepCard } from './customers.ts'
import { textOf, type Form } from './form-body.ts'
import { collect } from './invoicing.ts'

export function createPortal(books: Books, form: Form) {
  const customer = customerOf(books, textOf(form, 'customer') ?? '').id
  const id = books.id('bps')
  const returnUrl = textOf(form, 'return_url') ?? ''
  books.state.portals[id] = { customer, returnUrl }
  const url = `${books.baseUrl()}/portal/${id}`
  return { id, object: 'billing_portal.session', customer, return_url: returnUrl, created: books.now(), url }
}

/** A new card for what is charged from now on; open invoices are paid on their own pages. */
export function changeCard(books: Books, portalId: string, number: string): string {
  const portal = books.state.portals[portalId]
  const found = outcomeOf(number)
  if (!portal || !found) return 'This is none of the test cards.'
  if (found.outcome === 'declined') return `The card was declined (${found.reason}).`
  keepCard(books, portal.customer, number)
  return 'The new card is kept.'
}

/** Tries an open invoice again, with the card of now. */
export function payInvoice(books: Books, invoiceId: string): string {
  const invoice = invoiceOf(books, invoiceId)
  if (invoice.status !== 'open') return 'This invoice is not open.'
  return collect(books, invoiceId) ? 'Paid.' : 'The card was declined.'
}
