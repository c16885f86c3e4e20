/** The results of the year up to a day, in the order given. Dates as `2026-11-12`. */
export function lastYear<T extends { date: string }>(results: readonly T[], until: string): T[] {
  const from = `${Number(until.slice(0, 4)) - 1}${until.slice(4)}`
  return results.filter(({ date }) => date >= from && date <= until)
}
