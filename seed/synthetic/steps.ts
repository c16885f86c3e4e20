import { softRise } from './pulses.ts'

/** A smooth change to the value `to` within `widthS` from `atS` on. */
export interface Step {
  atS: number
  widthS: number
  to: number
}

/** A value that goes from one step's to the next; steps come in the order of time. */
export function stepsOf(atFirst: number, steps: readonly Step[]): (timeS: number) => number {
  const changes = steps
    .map(({ atS, widthS, to }, i) => ({ atS, widthS, by: to - (steps[i - 1]?.to ?? atFirst) }))
    .filter(({ by }) => by !== 0)
  return (timeS) => {
    let value = atFirst
    for (const { atS, widthS, by } of changes) {
      const u = (timeS - atS) / widthS
      if (u > 0) value += by * (u >= 1 ? 1 : softRise.value(u))
    }
    return value
  }
}
