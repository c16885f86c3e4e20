import type { ForceUnit, TimeUnit } from '../column-map.ts'
import { evenStep } from './content.ts'
import type { ColumnContent, ContentOf } from './content.ts'
import type { DraftMap } from './draft.ts'
import type { Heading } from './heading.ts'

/** A rate outside these belongs to no force plate: what a step in an unnamed time unit is judged by. */
export const PLATE_RATES_HZ = { slowest: 50, fastest: 20_000 }

/** The unit of time in which only this step fits a plate's rate. null where none does. */
export function timeUnitByStep(step: number): TimeUnit | null {
  const fits = (seconds: number): boolean =>
    1 / seconds >= PLATE_RATES_HZ.slowest && 1 / seconds <= PLATE_RATES_HZ.fastest
  if (fits(step)) return 's'
  return fits(step / 1000) ? 'ms' : null
}

/** A person's weight in newtons, on one plate or on two. */
const WEIGHT_N = { least: 100, greatest: 4000 }

/** The unit in which a column's greatest force is one that people make. A guess, to be confirmed. */
export function guessForceUnit(contents: readonly ColumnContent[]): ForceUnit | null {
  const greatest = Math.max(
    ...contents.map(({ least, greatest: most }) => Math.max(Math.abs(least), Math.abs(most))),
  )
  if (greatest >= WEIGHT_N.least) return 'N'
  if (greatest >= 10) return 'kgf'
  return greatest >= WEIGHT_N.least / 1000 && greatest < 10 ? 'kN' : null
}

/** A column of numbers that looks like a force: it stands at a level of hundreds, or reaches it. */
function looksLikeForce(content: ColumnContent): boolean {
  return content.filled > 0.9 && content.greatest > content.least && evenStep(content) === null
}

/** The likeliest map of columns that no heading explains, for a person to confirm or correct. */
export function guessMap(
  headings: readonly Heading[],
  numeric: readonly number[],
  contentOf: ContentOf,
): DraftMap {
  const nameOf = (index: number): string => headings[index]?.name ?? ''
  const rising = numeric.filter((index) => evenStep(contentOf(index)) !== null)
  const timed = rising.find((index) => headings[index]?.quantity === 'time') ?? rising[0]
  const step = timed === undefined ? null : evenStep(contentOf(timed))
  const time =
    timed === undefined || step === null
      ? null
      : { index: timed, name: nameOf(timed), unit: step === 1 ? ('samples' as const) : timeUnitByStep(step) }
  const named = numeric.filter((index) => headings[index]?.quantity === 'force')
  const forces =
    named.length > 0 ? named : numeric.filter((index) => index !== timed && looksLikeForce(contentOf(index)))
  const chosen = forces
    .toSorted((a, b) => Math.abs(contentOf(b).level) - Math.abs(contentOf(a).level))
    .slice(0, 2)
    .toSorted((a, b) => a - b)
  const unit = guessForceUnit(chosen.map(contentOf))
  return {
    time,
    forces: chosen.map((index, i) => ({
      index,
      name: nameOf(index),
      unit,
      channel: chosen.length === 1 ? 'single' : i === 0 ? 'left' : 'right',
    })),
  }
}
