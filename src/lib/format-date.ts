const dayLong = new Intl.DateTimeFormat('en-GB', {
  day: 'numeric',
  month: 'long',
  year: 'numeric',
  timeZone: 'UTC',
})
const dayShort = new Intl.DateTimeFormat('en-GB', {
  day: 'numeric',
  month: 'short',
  year: 'numeric',
  timeZone: 'UTC',
})

/** A calendar date such as `2026-11-12` as "12 November 2026". It has no time zone: it is the club's local date. */
export function formatDate(isoDate: string): string {
  return dayLong.format(new Date(`${isoDate}T00:00:00Z`))
}

/** The same as "12 Nov 2026", for tables. */
export function formatDateShort(isoDate: string): string {
  return dayShort.format(new Date(`${isoDate}T00:00:00Z`))
}

/** A moment as "12 Nov 2026, 14:05" in the club's time zone. */
export function formatMoment(moment: string, timeZone: string): string {
  return new Intl.DateTimeFormat('en-GB', {
    day: 'numeric',
    month: 'short',
    year: 'numeric',
    hour: '2-digit',
    minute: '2-digit',
    timeZone,
  }).format(new Date(moment))
}

/** Today's date in a time zone, `2026-11-12`. */
export function todayIn(timeZone: string, now: Date): string {
  const parts = new Intl.DateTimeFormat('en-CA', {
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
    timeZone,
  })
  return parts.format(now)
}
