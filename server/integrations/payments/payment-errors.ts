import Stripe from 'stripe'
import { namedError } from '../../http/errors.ts'

export const paymentsOff = () =>
  namedError('payments-off', 409, 'No payment service is set up here. Whoever runs this installation can.')

const declined = () =>
  namedError(
    'payment-declined',
    402,
    'The card was declined, and nothing was changed. Give another card under “Card and invoices”, then try again.',
  )

const away = () =>
  namedError(
    'payments-away',
    503,
    'The payment service gave no usable answer. Wait a moment, look at what is shown, then try again: nothing is charged twice.',
  )

export const signatureInvalid = () =>
  namedError('signature-invalid', 400, 'This is not signed by the payment service, or it is too old.')

/** Asks the service, and turns its refusals into errors that a person understands. */
export async function ask<T>(question: Promise<T>): Promise<T> {
  try {
    return await question
  } catch (error) {
    if (error instanceof Stripe.errors.StripeCardError) throw declined()
    if (error instanceof Stripe.errors.StripeError) throw Object.assign(away(), { cause: error })
    throw error
  }
}
