import type { Note } from '../../mechanics/types.ts'
import { readingNotes } from '../notes.ts'
import { theOneWithWeight } from './content.ts'
import type { ContentOf } from './content.ts'
import type { ForceColumn } from './draft.ts'

type Axis = 'x' | 'y' | 'z'
const AXES: readonly Axis[] = ['x', 'y', 'z']

/** The vertical forces among the force columns, and whether the weight had to tell which they are. */
export interface VerticalForces {
  columns: ForceColumn[]
  byWeight: boolean
  notes: Note[]
}

/** The columns of one plate share their words but for the axis. */
function byPlate(columns: ForceColumn[]): ForceColumn[][] {
  const plates = new Map<string, ForceColumn[]>()
  for (const column of columns) {
    const key = `${column.heading.foot ?? ''} ${column.heading.plate}`
    plates.set(key, [...(plates.get(key) ?? []), column])
  }
  return [...plates.values()]
}

const withAxis = (columns: ForceColumn[], axis: Axis): ForceColumn[] =>
  columns.filter((column) => column.heading.axis === axis)

/** The axis along which the plates together carry the weight; null where none stands out. */
function axisWithWeight(lettered: ForceColumn[], contentOf: ContentOf): Axis | null {
  const carried = AXES.map((axis) => {
    const levels = withAxis(lettered, axis).map((column) => contentOf(column.index).level)
    return levels.reduce((sum, level) => sum + (Number.isNaN(level) ? 0 : level), 0)
  })
  const best = theOneWithWeight(
    carried.map((level) => ({
      values: new Float64Array(0),
      filled: 1,
      level,
      least: level,
      greatest: level,
    })),
  )
  return best === null ? null : (AXES[best] ?? null)
}

function byLetter(lettered: ForceColumn[], contentOf: ContentOf): VerticalForces {
  const z = withAxis(lettered, 'z')
  const hasThree = byPlate(lettered).some((plate) => AXES.every((axis) => withAxis(plate, axis).length > 0))
  // Z alone is upright by convention; beside X and Y the weight tells, for laboratories differ.
  if (z.length > 0 && !hasThree) return { columns: z, byWeight: false, notes: [] }
  const axis = axisWithWeight(lettered, contentOf)
  if (axis === null || axis === 'z') return { columns: z, byWeight: false, notes: [] }
  const columns = withAxis(lettered, axis)
  return { columns, byWeight: true, notes: [readingNotes.verticalByWeight(columns.map(({ name }) => name))] }
}

/** Threes of columns that nothing names: in each the one that carries the weight, where one does in every three. */
function byThrees(columns: ForceColumn[], contentOf: ContentOf): ForceColumn[] | null {
  if (columns.length !== 3 && columns.length !== 6) return null
  const chosen: ForceColumn[] = []
  for (let at = 0; at < columns.length; at += 3) {
    const three = columns.slice(at, at + 3)
    const best = theOneWithWeight(three.map((column) => contentOf(column.index)))
    const column = best === null ? undefined : three[best]
    if (!column) return null
    chosen.push(column)
  }
  return chosen
}

/**
 * Which force columns are vertical: those that say so in words; else, where the three components of a plate are
 * there, those along the axis that carries the weight; else those along z.
 */
export function verticalForces(columns: ForceColumn[], contentOf: ContentOf): VerticalForces {
  const said = columns.filter((column) => column.heading.axis === 'up')
  if (said.length > 0) return { columns: said, byWeight: false, notes: [] }
  const lettered = columns.filter((column) => AXES.includes(column.heading.axis as Axis))
  const plain = columns.filter((column) => column.heading.axis === null)
  const vertical = lettered.length > 0 ? byLetter(lettered, contentOf) : null
  if (vertical && vertical.columns.length > 0) return vertical
  const feet = new Set(plain.map((column) => column.heading.foot))
  const isOpen = !feet.has('total') && plain.length === 3 * feet.size
  const chosen = isOpen ? byThrees(plain.toSorted(byFoot), contentOf) : null
  if (chosen && chosen.length < plain.length)
    return {
      columns: chosen,
      byWeight: true,
      notes: [readingNotes.verticalByWeight(chosen.map(({ name }) => name))],
    }
  const six = feet.size === 1 && feet.has(null) && plain.length === 6 ? byThrees(plain, contentOf) : null
  if (six)
    return {
      columns: six,
      byWeight: true,
      notes: [readingNotes.verticalByWeight(six.map(({ name }) => name))],
    }
  return { columns: plain, byWeight: false, notes: [] }
}

function byFoot(a: ForceColumn, b: ForceColumn): number {
  return (a.heading.foot ?? '').localeCompare(b.heading.foot ?? '', 'en')
}
