/** Numbers that programs write for a missing sample (common practice). */
const SENTINELS = new Set([
  -999, -9999, -99_999, -999_999, 9999, 99_999, 999_999, -32_768, 32_767, -999.99, -9999.99,
])

/** A column without the marks for missing samples in it. */
export interface WithoutSentinels {
  values: Float64Array
  /** The mark and how often it stood there; null without any. */
  found: { value: number; count: number } | null
}

/** Greatest step between neighbours neither of which is the mark. */
function greatestStep(values: Float64Array, mark: number): number {
  let greatest = 0
  let before = NaN
  for (const value of values) {
    if (value === mark || Number.isNaN(value)) continue
    const step = Math.abs(value - before)
    if (step > greatest) greatest = step
    before = value
  }
  return greatest
}

/** Whether every run of the mark stands farther from its neighbours than any two others do from each other. */
function standsApart(values: Float64Array, mark: number): boolean {
  const step = greatestStep(values, mark)
  for (let i = 0; i < values.length; i++) {
    if (values[i] !== mark) continue
    for (const beside of [values[i - 1], values[i + 1]]) {
      if (beside !== undefined && beside !== mark && Math.abs(beside - mark) <= step) return false
    }
  }
  return true
}

/** Blanks out a mark for missing samples: a well-known one that is the column's least or greatest number by far. */
export function withoutSentinels(values: Float64Array): WithoutSentinels {
  let [least, greatest] = [Infinity, -Infinity]
  for (let i = 0; i < values.length; i++) {
    const value = values[i] as number
    if (value < least) least = value
    if (value > greatest) greatest = value
  }
  const mark = SENTINELS.has(least) ? least : SENTINELS.has(greatest) ? greatest : NaN
  if (Number.isNaN(mark) || least === greatest || !standsApart(values, mark)) return { values, found: null }
  let count = 0
  const blanked = values.map((value) => {
    if (value !== mark) return value
    count++
    return NaN
  })
  return { values: blanked, found: { value: mark, count } }
}
