/**
 * Arrays of the length of a record that one analysis after another uses again: eight fresh ones for each trial cost
 * more in garbage collection than the arithmetic in them. An analysis runs to its end without interruption and gives
 * out numbers only, so nothing of one trial is seen in the next. What a borrower does not write holds old values.
 */
const slots = new Map<string, Float64Array>()

/** Longer records get arrays of their own, so that one long file does not hold memory for good. */
const longestKept = 100_000

/** The array of a slot, of the asked length. Two uses at the same time need two slots. */
export function borrow(slot: string, length: number): Float64Array {
  if (length > longestKept) return new Float64Array(length)
  const kept = slots.get(slot)
  if (kept && kept.length === length) return kept
  const fresh = new Float64Array(length)
  slots.set(slot, fresh)
  return fresh
}
