const months = 14
const dayMs = 24 * 60 * 60 * 1000

export interface DemoDay {
  /** 0 is the first session of the history. */
  index: number
  date: string
  latest: boolean
}

/** A day a month for 14 months, the latest a few days before today; squads test on different days. */
export function demoDays(today: Date, squad: number): DemoDay[] {
  const latest = new Date(today.getTime() - (2 + squad) * dayMs)
  return Array.from({ length: months }, (_, index) => {
    const back = months - 1 - index
    // The 28th is in every month.
    const day = Math.min(28, latest.getUTCDate())
    const date = new Date(Date.UTC(latest.getUTCFullYear(), latest.getUTCMonth() - back, day))
    return { index, date: (back === 0 ? latest : date).toISOString().slice(0, 10), latest: back === 0 }
  })
}

/** In the evening of a session's day. */
export const eveningOf = (date: string): Date => new Date(`${date}T18:30:00Z`)

/** The date so many days before another. */
export const daysEarlier = (date: string, days: number): string =>
  new Date(Date.parse(`${date}T00:00:00Z`) - days * dayMs).toISOString().slice(0, 10)
