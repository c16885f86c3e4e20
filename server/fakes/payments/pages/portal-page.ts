import { type Books, customerOf, defaultCard, invoiceOf, portalOf } from '../books.ts'
import { day, escapeHtml, money, note, page } from './html.ts'

/** The card and the invoices of a customer. */
export function portalPage(books: Books, id: string, said?: string): string {
  const { customer: customerId, returnUrl } = portalOf(books, id)
  const customer = customerOf(books, customerId)
  const card = defaultCard(books, customerId)
  const rows = Object.values(books.state.invoices)
    .filter((invoice) => invoice.customer === customerId)
    .reverse()
    .map(
      (invoice) =>
        `<tr><td><a href="/invoices/${invoice.id}">${invoice.number}</a></td><td>${day(invoice.created)}</td><td>${money(invoice.total, invoice.currency)}</td><td>${invoice.status}</td></tr>`,
    )
  return page(
    'Billing',
    `${note(said)}<p>${escapeHtml(customer.name ?? '')}</p>
<p>Card: ${card ? `ends in ${card.card.last4}` : 'none'}</p>
<form method="post"><label>New card number <input name="number" autocomplete="off" required></label><button>Keep this card</button></form>
<table><thead><tr><th>Invoice</th><th>Made</th><th>Total</th><th>State</th></tr></thead><tbody>${rows.join('')}</tbody></table>
<p><a href="${escapeHtml(returnUrl)}">Back to the club</a></p>`,
  )
}

export function invoicePage(books: Books, id: string, said?: string): string {
  const invoice = invoiceOf(books, id)
  const customer = customerOf(books, invoice.customer)
  const lines = invoice.lines.data
    .map(
      ({ description, amount }) =>
        `<tr><td>${escapeHtml(description)}</td><td>${money(amount, invoice.currency)}</td></tr>`,
    )
    .join('')
  const pay =
    invoice.status === 'open'
      ? '<form method="post"><button>Pay now with the card on file</button></form>'
      : ''
  return page(
    `Invoice ${invoice.number}`,
    `${note(said)}<p>${escapeHtml(customer.name ?? '')} ${escapeHtml(customer.tax_ids.join(', '))}, ${day(invoice.created)}</p>
<table>${lines}<tr><th>Total</th><th>${money(invoice.total, invoice.currency)}</th></tr></table>
<p>${invoice.status}</p>${pay}`,
  )
}
