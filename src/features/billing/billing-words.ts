import type { Billing, Interval } from '../../../shared/contracts/billing.ts'
import { formatMoment } from '../../lib/format-date.ts'

export const intervalWords: Record<Interval, string> = { month: 'Monthly', year: 'Yearly' }
export const perInterval: Record<Interval, string> = { month: 'a month', year: 'a year' }

interface StateWords {
  tone: 'plain' | 'caution' | 'stop'
  title: string
  sentence: string
}

/** How the club stands, and what follows from it; null where all is well. */
export function stateWords(
  { state, readsOnly, readsOnlyFrom, subscription }: Billing,
  timeZone: string,
): StateWords | null {
  const until = readsOnlyFrom === null ? '' : formatMoment(readsOnlyFrom, timeZone)
  const kept = 'Everything is kept, and can be read and taken along.'
  if (readsOnly) {
    const way = state === 'unpaid' || state === 'past-due' ? 'Pay the open invoice' : 'Buy seats'
    return {
      tone: 'stop',
      title: 'The club can only read',
      sentence: `Nothing can be uploaded or changed since ${until}. ${kept} ${way} to open it again.`,
    }
  }
  if (state === 'trial') {
    return {
      tone: 'plain',
      title: `Trial until ${until}`,
      sentence: `After that the club can only read, until it buys seats. ${kept}`,
    }
  }
  if (state === 'past-due' || state === 'unpaid') {
    return {
      tone: 'caution',
      title: 'A payment was declined',
      sentence: `It is tried again by itself. Give another card, or pay the open invoice: from ${until} on the club can only read. ${kept}`,
    }
  }
  if (subscription?.endsWithPeriod) {
    const end = formatMoment(subscription.periodEnd, timeZone)
    return {
      tone: 'caution',
      title: `The subscription ends on ${end}`,
      sentence: `After that the club can only read. ${kept}`,
    }
  }
  return null
}
