import { namedError } from '../../http/errors.ts'

export const subscriptionRunning = () =>
  namedError('subscription-running', 409, 'The club has a running subscription. Change its seats instead.')

export const subscriptionMissing = () =>
  namedError('subscription-missing', 409, 'The club has no running subscription. Buy one first.')

export const invoiceOpen = () =>
  namedError(
    'payment-declined',
    402,
    'An invoice could not be charged and is still open. Pay it under “Card and invoices” first.',
  )

export const endsSoon = () =>
  namedError(
    'subscription-missing',
    409,
    'The subscription ends with its period. Take that back first, then change its seats.',
  )
