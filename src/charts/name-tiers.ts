/**
 * Puts names that stand centred over their marks on as few tiers as keep them from touching: for each, in order
 * of place, the lowest tier that is free there. Tier 0 is the one next to the marks.
 */
export function nameTiers(names: readonly { x: number; width: number }[], gap: number): number[] {
  const order = names.map((_, i) => i).sort((a, b) => names[a]!.x - names[b]!.x)
  const tiers = new Array<number>(names.length).fill(0)
  const ends: number[] = []
  for (const i of order) {
    const { x, width } = names[i]!
    let tier = 0
    while (ends[tier] !== undefined && ends[tier]! + gap > x - width / 2) tier++
    ends[tier] = x + width / 2
    tiers[i] = tier
  }
  return tiers
}
