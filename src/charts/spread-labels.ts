/**
 * Moves labels apart along one axis: each stays as near as it can to where it wants to be, at least `gap` from
 * the next, within `from` and `to`. Answers in the order given. Where they cannot all fit they keep the gap and
 * run over the far end.
 */
export function spreadLabels(wanted: readonly number[], gap: number, from: number, to: number): number[] {
  const order = wanted.map((_, i) => i).sort((a, b) => wanted[a]! - wanted[b]!)
  const placed = [...wanted]
  let floor = from
  for (const i of order) {
    placed[i] = Math.max(wanted[i]!, floor)
    floor = placed[i]! + gap
  }
  let ceiling = to
  for (const i of [...order].reverse()) {
    placed[i] = Math.max(Math.min(placed[i]!, ceiling), from)
    ceiling = placed[i]! - gap
  }
  floor = from
  for (const i of order) {
    placed[i] = Math.max(placed[i]!, floor)
    floor = placed[i]! + gap
  }
  return placed
}
