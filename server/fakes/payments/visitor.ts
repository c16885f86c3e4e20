import { keepCard } from './customers.ts'
import type { PaymentService } from './payment-service.ts'

/** What a person types on the checkout page. */
export interface Purchase {
  number: string
  promotion?: string
  taxId?: string
  /** How the second step ends, where the card asks for it. */
  second?: 'yes' | 'no'
}

/** Buys on the checkout page without a browser; returns the page, or '' where it leads back to the product. */
export async function buy(
  url: string,
  { number, promotion = '', taxId = '', second }: Purchase,
): Promise<string> {
  const page = await post(url, { number, promotion, taxId })
  return second && page.includes('A second step') ? post(url, { second }) : page
}

async function post(url: string, form: Record<string, string>): Promise<string> {
  const answer = await fetch(url, { method: 'POST', body: new URLSearchParams(form), redirect: 'manual' })
  return answer.status === 303 ? '' : answer.text()
}

/** Gives a customer another card, as in the portal. */
export const giveNewCard = ({ books }: PaymentService, customerId: string, number: string) =>
  keepCard(books, customerId, number)
