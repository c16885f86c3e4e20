import type { Books } from './books.ts'
import type { Delivery } from './delivery.ts'
import type { Fault } from './faults.ts'

/** A local payment service that runs. */
export interface PaymentService {
  url: string
  books: Books
  delivery: Delivery
  faults: Fault[]
  /** May be set later than the service itself. */
  webhookUrl: string | undefined
  /** Moves the clock on, does what fell due on the way, and delivers what is to be told. */
  advance(days: number): Promise<void>
  save(): void
  stop(): Promise<void>
}
