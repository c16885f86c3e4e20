/**
 * Indices of the samples that a line of `columns` pixels needs: of every column the least and the greatest
 * value, in the order they occur, with the first and the last sample of the stretch. A peak one sample wide
 * stays on the picture. `from` and `to` are whole samples, both included; an empty stretch gives none.
 */
export function decimate(values: Float64Array, from: number, to: number, columns: number): number[] {
  const first = Math.max(0, from)
  const last = Math.min(values.length - 1, to)
  const count = last - first + 1
  if (count <= 0) return []
  if (count <= 2 * columns) return Array.from({ length: count }, (_, i) => first + i)
  const indices = [first]
  const perColumn = count / columns
  for (let column = 0; column < columns; column++) {
    const start = first + Math.floor(column * perColumn)
    const end = Math.min(last + 1, first + Math.floor((column + 1) * perColumn))
    for (const index of extremes(values, start, end))
      if (index > indices[indices.length - 1]!) indices.push(index)
  }
  if (indices[indices.length - 1] !== last) indices.push(last)
  return indices
}

function extremes(values: Float64Array, start: number, end: number): [number, number] {
  let least = start
  let greatest = start
  for (let i = start + 1; i < end; i++) {
    if (values[i]! < values[least]!) least = i
    if (values[i]! > values[greatest]!) greatest = i
  }
  return least < greatest ? [least, greatest] : [greatest, least]
}
