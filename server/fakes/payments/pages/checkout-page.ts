import { type Books, checkoutOf, customerOf, priceOf } from '../books.ts'
import { testCards } from '../cards.ts'
import { escapeHtml, money, note, page } from './html.ts'

/** Where a club buys: what it costs, the card, a promotion code, a tax id. */
export function checkoutPage(books: Books, id: string, problem?: string): string {
  const session = checkoutOf(books, id)
  const price = priceOf(books, session.price)
  const customer = customerOf(books, session.customer)
  const total = money(price.unit_amount * session.quantity, price.currency)
  const cards = testCards.map(([number, words]) => `<li><code>${number}</code> ${words}</li>`).join('')
  return page(
    'Checkout',
    `${note(problem)}
<p>${escapeHtml(customer.name ?? 'A club')}: ${session.quantity} seats, <strong>${total}</strong> a ${price.recurring.interval}.</p>
<form method="post">
<label>Card number <input name="number" autocomplete="off" inputmode="numeric" required autofocus></label>
<label>Promotion code <input name="promotion" autocomplete="off"></label>
<label>Tax id <input name="taxId" autocomplete="off"></label>
<button>Pay and subscribe</button>
</form>
<p><a href="${escapeHtml(session.cancel_url)}">Go back without buying</a></p>
<p>Test cards:</p><ul>${cards}</ul>`,
  )
}

/** The card holder's bank asks: the second step. */
export const secondStepPage = () =>
  page(
    'A second step',
    `<p>The bank of this test card wants to know whether it is you.</p>
<form method="post"><button name="second" value="yes">Complete</button> <button name="second" value="no">Fail</button></form>`,
  )
