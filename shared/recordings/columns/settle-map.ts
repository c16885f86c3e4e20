import type { Note } from '../../mechanics/types.ts'
import { ReadFault } from '../errors.ts'
import { readingNotes } from '../notes.ts'
import type { ForceUnit } from '../column-map.ts'
import { listed, shown } from '../safe-text.ts'
import type { ContentOf } from './content.ts'
import type { DraftMap, ForceColumn, Settled, Why } from './draft.ts'
import { assignToFeet } from './feet.ts'
import { guessForceUnit, guessMap } from './guess.ts'
import type { Heading } from './heading.ts'
import { verticalForces } from './vertical.ts'

/** A table's headings, and its numbers where the headings do not tell. */
export interface Columns {
  headings: readonly Heading[]
  /** Line of the headings; null without any. */
  headerLine: number | null
  /** Columns that hold numbers. */
  numeric: readonly number[]
  contentOf: ContentOf
}

function noForceColumn(headings: readonly Heading[], line: number): ReadFault {
  const names = headings.map((heading) => heading.name).filter((name) => name !== '')
  const sentence = `None of the column headings ${listed(names)} names a vertical force.`
  return new ReadFault('no-force-column', sentence, { line, seen: shown(names.join(', ')) })
}

function unitFault(column: ForceColumn | undefined, line: number): ReadFault {
  const name = listed([column?.name ?? ''])
  const unit = column?.heading.unit
  const sentence =
    unit?.family === 'other'
      ? `The force column ${name} is in ${listed([unit.text])}, which is no unit of force.`
      : `The force column ${name} names no unit.`
  const place = { line, column: (column?.index ?? 0) + 1, seen: shown(column?.name ?? '') }
  return new ReadFault('unit-unknown', sentence, place)
}

/** Columns that say they are forces, in a unit of force or in none. */
function forceColumns({ headings, numeric }: Columns, line: number): ForceColumn[] {
  const all = headings.flatMap((heading, index): ForceColumn[] =>
    heading.quantity === 'force' ? [{ index, name: heading.name, heading }] : [],
  )
  if (all.length === 0) throw noForceColumn(headings, line)
  const read = all.filter((column) => column.heading.unit.family !== 'other')
  if (read.length === 0) throw unitFault(all[0], line)
  const filled = read.filter((column) => numeric.includes(column.index))
  return filled.length > 0 ? filled : read
}

/** The unit of each force column; one that names none takes what the others agree on. */
function settleUnits(
  columns: ForceColumn[],
  line: number,
): { unitOf: (column: ForceColumn) => ForceUnit; notes: Note[] } {
  const stated = new Set<ForceUnit>()
  const silent: ForceColumn[] = []
  const masses: ForceColumn[] = []
  for (const column of columns) {
    const { unit } = column.heading
    if (unit.family !== 'force') silent.push(column)
    else {
      stated.add(unit.unit)
      if (unit.isMass) masses.push(column)
    }
  }
  const [common] = stated
  if (silent.length > 0 && (stated.size !== 1 || common === undefined)) throw unitFault(silent[0], line)
  const names = (of: ForceColumn[]): string[] => of.map((column) => column.name)
  const notes = [
    ...(silent.length > 0 && common ? [readingNotes.unitInherited(names(silent), common)] : []),
    ...(masses.length > 0 ? [readingNotes.massAsForce(names(masses))] : []),
  ]
  const unitOf = ({ heading }: ForceColumn): ForceUnit =>
    heading.unit.family === 'force' ? heading.unit.unit : (common ?? 'N')
  return { unitOf, notes }
}

/** A column of time, or else one that counts samples. */
function timeColumn({ headings, numeric }: Columns): DraftMap['time'] {
  const find = (quantity: Heading['quantity']): number =>
    headings.findIndex((heading, index) => heading.quantity === quantity && numeric.includes(index))
  const time = find('time')
  const heading = headings[time]
  if (heading)
    return {
      index: time,
      name: heading.name,
      unit: heading.unit.family === 'time' ? heading.unit.unit : null,
    }
  const [sample, within] = [find('sample'), find('within')]
  const counted = headings[sample]
  if (!counted) return null
  const inner = headings[within]
  return {
    index: sample,
    name: counted.name,
    unit: 'samples',
    ...(inner ? { within: { index: within, name: inner.name } } : {}),
  }
}

function fromHeadings(columns: Columns, line: number): Omit<Settled, 'problem'> {
  const vertical = verticalForces(forceColumns(columns, line), columns.contentOf)
  if (vertical.columns.length === 0) throw noForceColumn(columns.headings, line)
  const { channels, total, notes } = assignToFeet(vertical.columns, columns.contentOf, line)
  const used = channels.flatMap((channel) => channel.columns)
  const { unitOf, notes: unitNotes } = settleUnits(used, line)
  const time = timeColumn(columns)
  const whys = new Map<number, Why>()
  if (vertical.byWeight)
    for (const { index } of used)
      whys.set(index, { confidence: 0.8, sentence: 'Of the components of its plate it carries the weight.' })
  if (total)
    whys.set(total.index, { confidence: 0.95, sentence: 'It is the sum of the others in nearly every row.' })
  const taken = new Set([
    time?.index,
    time?.within?.index,
    total?.index,
    ...used.map((column) => column.index),
  ])
  const ignored = columns.headings.filter((heading, index) => heading.name !== '' && !taken.has(index))
  const forces = channels
    .flatMap(({ channel, columns: its }) =>
      its.map((column) => ({ index: column.index, name: column.name, unit: unitOf(column), channel })),
    )
    .sort((a, b) => a.index - b.index)
  const unused = ignored.length > 0 ? [readingNotes.columnsIgnored(ignored.map(({ name }) => name))] : []
  return { draft: { time, forces }, notes: [...vertical.notes, ...notes, ...unitNotes, ...unused], whys }
}

/** The best there is of a map that a person must settle: units and feet by what the numbers look like. */
function guessed(columns: Columns): DraftMap {
  const { headings, numeric, contentOf } = columns
  const guess = guessMap(headings, numeric, contentOf)
  const forces = headings.flatMap((heading, index) =>
    heading.quantity === 'force' && numeric.includes(index) ? [{ index, heading }] : [],
  )
  if (forces.length === 0 || forces.length > 2) return guess
  const unit = guessForceUnit(forces.map(({ index }) => contentOf(index)))
  return {
    time: timeColumn(columns) ?? guess.time,
    forces: forces.map(({ index, heading }) => ({
      index,
      name: heading.name,
      unit: heading.unit.family === 'force' ? heading.unit.unit : unit,
      channel:
        forces.length === 1
          ? 'single'
          : heading.foot === 'left' || heading.foot === 'right'
            ? heading.foot
            : 'total',
    })),
  }
}

function noHeadings({ numeric }: Columns, seen: string): ReadFault {
  const sentence = `The file begins with numbers, and no headings say what its ${numeric.length} columns are: “${seen}”.`
  return new ReadFault('no-header', sentence, { line: 1, seen })
}

/**
 * Which column is what, from the headings, and from the numbers where the headings leave it open.
 * @param firstRow the first row of numbers as text, for a file without headings
 */
export function settleMap(columns: Columns, firstRow: string): Settled {
  try {
    if (columns.headerLine === null) throw noHeadings(columns, shown(firstRow))
    return { ...fromHeadings(columns, columns.headerLine), problem: null }
  } catch (error) {
    if (!(error instanceof ReadFault)) throw error
    return { draft: guessed(columns), notes: [], problem: error.readError, whys: new Map() }
  }
}
