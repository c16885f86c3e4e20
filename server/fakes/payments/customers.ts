import { type Books, customerOf, listed, tell } from './books.ts'
import { plainNumber } from './cards.ts'
import { groupOf, textOf, textsByName, wholeOf, type Form } from './form-body.ts'
import type { Card, Customer } from './shapes.ts'

export function createCustomer(books: Books, form: Form): Customer {
  const customer: Customer = {
    id: books.id('cus'),
    object: 'customer',
    created: books.now(),
    email: textOf(form, 'email') ?? null,
    name: textOf(form, 'name') ?? null,
    metadata: textsByName(groupOf(form, 'metadata')),
    invoice_settings: { default_payment_method: null },
    tax_ids: [],
  }
  books.state.customers[customer.id] = customer
  tell(books, 'customer.created', customer)
  return customer
}

/** Makes a card the one that the customer pays with. */
export function keepCard(books: Books, customerId: string, given: string): Card {
  const customer = customerOf(books, customerId)
  const number = plainNumber(given)
  const card: Card = {
    id: books.id('pm'),
    object: 'payment_method',
    type: 'card',
    customer: customerId,
    card: { brand: 'visa', last4: number.slice(-4), exp_month: 12, exp_year: 2034 },
    number,
  }
  books.state.cards[card.id] = card
  customer.invoice_settings.default_payment_method = card.id
  tell(books, 'customer.updated', customer)
  return card
}

export function listInvoices(books: Books, form: Form) {
  const customer = textOf(form, 'customer')
  const status = textOf(form, 'status')
  const found = Object.values(books.state.invoices)
    .filter((invoice) => !customer || invoice.customer === customer)
    .filter((invoice) => !status || invoice.status === status)
    .reverse()
  return listed('/v1/invoices', found.slice(0, wholeOf(form, 'limit') ?? 10))
}
