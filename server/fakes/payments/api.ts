import { customerOf, scheduleOf, subscriptionOf, type Books } from './books.ts'
import { createPrice, createProduct, listPrices } from './catalogue.ts'
import { createCheckout } from './checkout.ts'
import { createCustomer, listInvoices } from './customers.ts'
import type { Form } from './form-body.ts'
import { createPortal } from './portal.ts'
import { createSchedule, releaseSchedule, updateSchedule } from './schedules.ts'
import { listSubscriptions, previewInvoice, updateSubscription } from './subscriptions.ts'

type Answer = (books: Books, form: Form, id: string) => unknown

/** Every call that the product makes, and no other: a path and what answers it; `:id` is one part of the path. */
const calls: [method: string, path: string, answer: Answer][] = [
  ['POST', '/v1/customers', createCustomer],
  ['GET', '/v1/customers/:id', (books, _form, id) => customerOf(books, id)],
  ['POST', '/v1/products', createProduct],
  ['POST', '/v1/prices', createPrice],
  ['GET', '/v1/prices', listPrices],
  ['POST', '/v1/checkout/sessions', createCheckout],
  ['GET', '/v1/subscriptions', listSubscriptions],
  ['GET', '/v1/subscriptions/:id', (books, _form, id) => subscriptionOf(books, id)],
  ['POST', '/v1/subscriptions/:id', (books, form, id) => updateSubscription(books, id, form)],
  ['POST', '/v1/subscription_schedules', createSchedule],
  ['GET', '/v1/subscription_schedules/:id', (books, _form, id) => scheduleOf(books, id)],
  ['POST', '/v1/subscription_schedules/:id', (books, form, id) => updateSchedule(books, id, form)],
  ['POST', '/v1/subscription_schedules/:id/release', (books, _form, id) => releaseSchedule(books, id)],
  ['GET', '/v1/invoices', listInvoices],
  ['POST', '/v1/invoices/create_preview', previewInvoice],
  ['POST', '/v1/billing_portal/sessions', createPortal],
]

/** What answers a call; null where the product is not known to make it. */
export function findCall(method: string, path: string): ((books: Books, form: Form) => unknown) | null {
  for (const [verb, pattern, answer] of calls) {
    if (verb !== method) continue
    const match = new RegExp(`^${pattern.replace(':id', '([\\w]+)')}$`, 'u').exec(path)
    if (match) return (books, form) => answer(books, form, match[1] ?? '')
  }
  return null
}
