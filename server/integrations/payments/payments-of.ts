import type { Config } from '../../config/config.ts'
import type { Payments } from './payments.ts'
import { stripePayments } from './stripe-payments.ts'

type PaymentConfig = Pick<Config, 'stripeKey' | 'stripeWebhookSecret' | 'paymentServiceUrl'>

const opened = new WeakMap<PaymentConfig, Payments>()

/** The payments that a configuration asks for, one a process (it keeps its connections); null where it has no key. */
export function paymentsOf(config: PaymentConfig): Payments | null {
  if (!config.stripeKey) return null
  const payments = opened.get(config) ?? stripePayments(config)
  opened.set(config, payments)
  return payments
}
