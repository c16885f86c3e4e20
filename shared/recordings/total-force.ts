import type { Recording } from '../mechanics/types.ts'

/** Vertical force of all plates together in newtons: left + right, or the one channel there is. */
export function totalForce({ channels }: Recording): Float64Array {
  const { left, right } = channels
  if (left && right) return left.map((force, i) => force + (right[i] ?? 0))
  return channels.total ?? channels.single ?? left ?? right ?? new Float64Array(0)
}
