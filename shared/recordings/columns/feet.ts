import type { ForceChannel, Note } from '../../mechanics/types.ts'
import { ReadFault } from '../errors.ts'
import { readingNotes } from '../notes.ts'
import { listed, shown } from '../safe-text.ts'
import { isSumOf } from './content.ts'
import type { ContentOf } from './content.ts'
import type { ForceColumn } from './draft.ts'
import type { Heading } from './heading.ts'

/** Left and right, one column, or a sum: which force columns make which channel. */
export interface Assignment {
  channels: { channel: ForceChannel; columns: ForceColumn[] }[]
  /** A column that is the sum of the others. */
  total?: ForceColumn
  notes: Note[]
}

function ambiguous(columns: ForceColumn[], line: number): ReadFault {
  const names = columns.map((column) => column.name)
  const sentence = `The headings ${listed(names)} leave open which force belongs to which foot.`
  return new ReadFault('ambiguous-columns', sentence, { line, seen: shown(names.join(', ')) })
}

/** Several columns of one foot add up only when nothing but the part of the plate tells them apart. */
function areParts(columns: ForceColumn[]): boolean {
  const stem = columns[0]?.heading.stem
  return columns.every((column) => column.heading.isPart && column.heading.stem === stem)
}

/** Several plates, which may belong to several people; several sensors are one plate. */
function arePlates(columns: ForceColumn[]): boolean {
  return columns.some((column) =>
    /\b(?:plate|platform|platte|plateforme|plataforma)\b/u.test(column.heading.stem),
  )
}

const namesOf = (columns: ForceColumn[]): string[] => columns.map((column) => column.name)

function assignFeet(left: ForceColumn[], right: ForceColumn[], line: number): Assignment {
  const notes: Note[] = []
  for (const [channel, columns] of [
    ['left', left],
    ['right', right],
  ] as const) {
    if (columns.length === 1) continue
    if (left.length !== right.length || !areParts(columns)) throw ambiguous([...left, ...right], line)
    notes.push(readingNotes.columnsSummed(namesOf(columns), channel))
  }
  const channels: Assignment['channels'] = [
    { channel: 'left', columns: left },
    { channel: 'right', columns: right },
  ]
  return { channels, notes }
}

/** The one column that is the sum of all the others. */
function sumAmong(columns: ForceColumn[], contentOf: ContentOf): ForceColumn | undefined {
  return columns.find((column) =>
    isSumOf(
      contentOf(column.index),
      columns.filter((other) => other !== column).map((other) => contentOf(other.index)),
    ),
  )
}

/** Columns that name no foot. */
function assignUnnamed(columns: ForceColumn[], contentOf: ContentOf, line: number): Assignment {
  if (columns.length === 1) return { channels: [{ channel: 'single', columns }], notes: [] }
  const total = columns.length > 2 ? sumAmong(columns, contentOf) : undefined
  const parts = columns.filter((column) => column !== total)
  const beside = total ? [readingNotes.totalNotAdded(total.name)] : []
  const [first, second] = parts
  if (parts.length === 2 && first && second) {
    // The same force twice, raw and smoothed, is not that of two plates.
    if (isSumOf(contentOf(first.index), [contentOf(second.index)])) throw ambiguous(columns, line)
    const notes = [readingNotes.feetUnknown(namesOf(parts)), ...beside]
    return { channels: [{ channel: 'total', columns: parts }], notes, ...(total ? { total } : {}) }
  }
  if (total) {
    const notes = [readingNotes.columnsSummed(namesOf(parts), 'total'), ...beside]
    return { channels: [{ channel: 'total', columns: parts }], total, notes }
  }
  if (!areParts(columns) || arePlates(columns)) throw ambiguous(columns, line)
  return {
    channels: [{ channel: 'single', columns }],
    notes: [readingNotes.columnsSummed(namesOf(columns), 'single')],
  }
}

/**
 * Which vertical force belongs to which foot.
 * @throws ReadFault `ambiguous-columns` where headings and numbers leave it open
 */
export function assignToFeet(forces: ForceColumn[], contentOf: ContentOf, line: number): Assignment {
  const of = (foot: Heading['foot']): ForceColumn[] => forces.filter((column) => column.heading.foot === foot)
  const [left, right, total, unnamed] = [of('left'), of('right'), of('total'), of(null)]
  if (left.length > 0 && right.length > 0) {
    const [beside] = unnamed
    if (!beside) return assignFeet(left, right, line)
    const feet = [...left, ...right].map((column) => contentOf(column.index))
    if (unnamed.length > 1 || !isSumOf(contentOf(beside.index), feet)) throw ambiguous(forces, line)
    const assigned = assignFeet(left, right, line)
    return { ...assigned, total: beside, notes: [...assigned.notes, readingNotes.totalNotAdded(beside.name)] }
  }
  const footed = left.length + right.length
  if (total.length === 1) return { channels: [{ channel: 'total', columns: total }], notes: [] }
  if (total.length > 1 || (footed > 0 && forces.length > 1)) return oneFoot(left, right, forces, line)
  if (footed === 1)
    return {
      channels: [{ channel: 'single', columns: forces }],
      notes: [readingNotes.oneFootOnly(forces[0]?.name ?? '')],
    }
  return assignUnnamed(unnamed, contentOf, line)
}

/** Parts of the plate under one foot, the other foot being on none. */
function oneFoot(left: ForceColumn[], right: ForceColumn[], forces: ForceColumn[], line: number): Assignment {
  const columns = left.length > 0 ? left : right
  if (columns.length !== forces.length || !areParts(columns)) throw ambiguous(forces, line)
  return {
    channels: [{ channel: 'single', columns }],
    notes: [readingNotes.columnsSummed(namesOf(columns), 'single')],
  }
}
