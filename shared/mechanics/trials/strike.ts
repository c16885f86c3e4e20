import type { Unloaded } from '../events/unloaded.ts'
import type { Settings } from '../settings.ts'
import { usualLevel, type Signal } from '../signal/condition.ts'

/** Force as recorded that no step reaches, but a fall onto the plates and a push off them do. */
export function strongForce({ total }: Signal, { level }: Unloaded, settings: Settings): number {
  const loaded = total.filter((newton) => newton > level + settings.smallestLoadN)
  return level + settings.strikeShare * (usualLevel(loaded) - level)
}

/** Whether the force reaches a level between two samples. */
export function reaches(total: Float64Array, strong: number, from: number, to: number): boolean {
  const last = Math.min(total.length, to)
  for (let i = Math.max(0, from); i < last; i++) if (total[i] >= strong) return true
  return false
}
