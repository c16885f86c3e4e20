/** What the numbers of one column are like. */
export interface ColumnContent {
  values: Float64Array
  /** Share of rows that hold a number. */
  filled: number
  /** Median of some 200 values spread over the column: where it usually is. */
  level: number
  least: number
  greatest: number
}

/** Reads columns by their index, when they are needed. */
export type ContentOf = (index: number) => ColumnContent

const LOOKED_AT = 200

/** What a column holds, from all of its rows; an empty one is NaN throughout. */
export function contentOf(values: Float64Array): ColumnContent {
  let [count, least, greatest] = [0, Infinity, -Infinity]
  for (const value of values) {
    if (Number.isNaN(value)) continue
    count++
    if (value < least) least = value
    if (value > greatest) greatest = value
  }
  if (count === 0) return { values, filled: 0, level: NaN, least: NaN, greatest: NaN }
  return { values, filled: count / values.length, level: levelOf(values), least, greatest }
}

/** Median of some 200 values spread over the record, blanks left out. */
export function levelOf(values: Float64Array): number {
  const step = Math.max(1, values.length / LOOKED_AT)
  const some: number[] = []
  for (let at = 0; at < values.length; at += step) {
    const value = values[Math.floor(at)] ?? NaN
    if (!Number.isNaN(value)) some.push(value)
  }
  return some.sort((a, b) => a - b)[some.length >> 1] ?? NaN
}

/** Share of a sum that two ways of writing the same force may differ by, and what rounding may leave, in file units. */
const SUM_TOLERANCE = { share: 0.005, absolute: 0.02 }

/** Whether `total` is the sum of `parts` in nearly every row. */
export function isSumOf(total: ColumnContent, parts: readonly ColumnContent[]): boolean {
  const rows = total.values.length
  let [compared, equal] = [0, 0]
  for (let row = 0; row < rows; row++) {
    const sum = parts.reduce((newtons, part) => newtons + (part.values[row] ?? NaN), 0)
    const off = Math.abs(sum - (total.values[row] ?? NaN))
    if (Number.isNaN(off)) continue
    compared++
    if (off <= SUM_TOLERANCE.share * Math.abs(sum) + SUM_TOLERANCE.absolute * (parts.length + 1)) equal++
  }
  return compared > 0 && equal >= 0.98 * compared
}

/** The one column that carries a weight where the others hardly do: the upright component. null where none stands out. */
export function theOneWithWeight(contents: readonly ColumnContent[]): number | null {
  const levels = contents.map(({ level }) => Math.abs(level))
  const best = levels.reduce((at, level, i) => (level > (levels[at] ?? 0) ? i : at), 0)
  const most = levels[best] ?? NaN
  // Standing still, the ground pushes up only; leaning costs a few hundredths of the weight.
  const standsOut = most > 0 && levels.every((level, i) => i === best || !(level > 0.2 * most))
  return standsOut ? best : null
}

/** Step of a column that rises evenly, or null. */
export function evenStep({ values, filled }: ColumnContent): number | null {
  const last = values.length - 1
  const step = ((values[last] ?? NaN) - (values[0] ?? NaN)) / last
  if (filled < 1 || !(step > 0)) return null
  for (let row = 1; row <= last; row++) {
    const off = Math.abs((values[row] ?? NaN) - (values[0] ?? NaN) - row * step)
    if (!(off <= 2 * step)) return null
  }
  return step
}
