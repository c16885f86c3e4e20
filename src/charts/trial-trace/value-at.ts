/** The value at an instant, on the straight line between its two samples; held at both ends of the record. */
export function valueAt(values: Float64Array, sampleRateHz: number, timeS: number): number {
  const place = Math.min(Math.max(timeS * sampleRateHz, 0), values.length - 1)
  const before = Math.floor(place)
  const after = Math.min(before + 1, values.length - 1)
  return values[before]! + (values[after]! - values[before]!) * (place - before)
}
