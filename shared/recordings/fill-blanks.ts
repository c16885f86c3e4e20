/**
 * A copy of `values` with each NaN on the straight line between its neighbours; at the ends the neighbour itself.
 * `longestRun` is the greatest number of blanks in a row.
 */
export function fillBlanks(values: Float64Array): {
  filled: Float64Array
  count: number
  longestRun: number
} {
  const filled = values.slice()
  let count = 0
  let longestRun = 0
  for (let i = 0; i < filled.length; i++) {
    if (!Number.isNaN(filled[i])) continue
    let end = i
    while (end < filled.length && Number.isNaN(filled[end])) end++
    bridge(filled, i, end)
    count += end - i
    longestRun = Math.max(longestRun, end - i)
    i = end
  }
  return { filled, count, longestRun }
}

function bridge(values: Float64Array, from: number, to: number): void {
  const after = to < values.length ? values[to] : undefined
  const before = from > 0 ? values[from - 1] : after
  const start = before ?? NaN
  const end = after ?? start
  const intervals = to - from + 1
  for (let i = from; i < to; i++) values[i] = start + ((end - start) * (i - from + 1)) / intervals
}
