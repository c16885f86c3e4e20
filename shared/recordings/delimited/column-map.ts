import type { ForceChannel, Note } from '../../mechanics/types.ts'
import { ReadFault } from '../errors.ts'
import { readingNotes } from '../notes.ts'
import type { ColumnMap, ForceUnit, MappedColumn, TimeUnit } from '../result.ts'
import { listed, shown } from '../safe-text.ts'
import type { Heading } from './header-cell.ts'

interface ForceColumn extends MappedColumn {
  heading: Heading
}

/** The map of a head, before the time unit is settled: a time column without a unit is judged by its steps. */
export interface ProposedMap {
  time: (MappedColumn & { unit: TimeUnit | null }) | null
  forces: ColumnMap['forces']
  notes: Note[]
}

/** Left and right, one column, or a sum: which force columns make which channel. */
interface Assignment {
  channels: { channel: ForceChannel; columns: ForceColumn[] }[]
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

function assignFeet(left: ForceColumn[], right: ForceColumn[], line: number): Assignment {
  const notes: Note[] = []
  for (const [channel, columns] of [
    ['left', left],
    ['right', right],
  ] as const) {
    if (columns.length === 1) continue
    if (left.length !== right.length || !areParts(columns)) throw ambiguous([...left, ...right], line)
    notes.push(
      readingNotes.columnsSummed(
        columns.map((column) => column.name),
        channel,
      ),
    )
  }
  return {
    channels: [
      { channel: 'left', columns: left },
      { channel: 'right', columns: right },
    ],
    notes,
  }
}

function assign(forces: ForceColumn[], line: number): Assignment {
  const of = (foot: Heading['foot']): ForceColumn[] => forces.filter((column) => column.heading.foot === foot)
  const [left, right, total, unnamed] = [of('left'), of('right'), of('total'), of(null)]
  const footed = left.length + right.length
  if (left.length > 0 && right.length > 0) {
    if (unnamed.length > 0) throw ambiguous(forces, line)
    return assignFeet(left, right, line)
  }
  if (total.length === 1) return { channels: [{ channel: 'total', columns: total }], notes: [] }
  if (total.length > 1 || (footed > 0 && forces.length > 1)) throw ambiguous(forces, line)
  const names = forces.map((column) => column.name)
  if (forces.length === 1) {
    const notes = footed === 1 ? [readingNotes.oneFootOnly(names[0] ?? '')] : []
    return { channels: [{ channel: 'single', columns: forces }], notes }
  }
  if (forces.length > 2) throw ambiguous(forces, line)
  return { channels: [{ channel: 'total', columns: unnamed }], notes: [readingNotes.feetUnknown(names)] }
}

/** Force columns of the head, the vertical ones alone where any is called so. */
function forceColumns(headings: Heading[], line: number): ForceColumn[] {
  const all = headings.flatMap((heading, index): ForceColumn[] =>
    heading.quantity === 'force' ? [{ index, name: heading.name, heading }] : [],
  )
  if (all.length === 0) {
    const names = headings.map((heading) => heading.name).filter((name) => name !== '')
    const sentence = `None of the column headings ${listed(names)} names a vertical force.`
    throw new ReadFault('no-force-column', sentence, { line, seen: shown(names.join(', ')) })
  }
  const read = all.filter((column) => column.heading.unit.family !== 'other')
  const vertical = read.filter((column) => column.heading.vertical)
  if (read.length === 0) throw unitFault(all[0], line)
  return vertical.length > 0 ? vertical : read
}

function unitFault(column: ForceColumn | undefined, line: number): ReadFault {
  const unit = column?.heading.unit
  const name = listed([column?.name ?? ''])
  const sentence =
    unit?.family === 'other'
      ? `The force column ${name} is in ${listed([unit.text])}, and only N and kN are read.`
      : `The force column ${name} names no unit.`
  return new ReadFault('unit-unknown', sentence, {
    line,
    column: (column?.index ?? 0) + 1,
    seen: shown(column?.name ?? ''),
  })
}

/** The unit of each force column; one that names none takes what the others agree on. */
function settleUnits(
  columns: ForceColumn[],
  line: number,
): { unitOf: (column: ForceColumn) => ForceUnit; notes: Note[] } {
  const stated = new Set<ForceUnit>()
  const silent: ForceColumn[] = []
  for (const column of columns) {
    if (column.heading.unit.family === 'force') stated.add(column.heading.unit.unit)
    else silent.push(column)
  }
  const [common] = stated
  if (silent.length > 0 && (stated.size !== 1 || common === undefined)) throw unitFault(silent[0], line)
  const notes =
    silent.length > 0 && common
      ? [
          readingNotes.unitInherited(
            silent.map((column) => column.name),
            common,
          ),
        ]
      : []
  const unitOf = ({ heading }: ForceColumn): ForceUnit =>
    heading.unit.family === 'force' ? heading.unit.unit : (common ?? 'N')
  return { unitOf, notes }
}

/** Which column is what, from the headings alone. `line` is the headings' line, for errors. */
export function proposeMap(headings: Heading[], line: number): ProposedMap {
  const forces = forceColumns(headings, line)
  const { channels, notes } = assign(forces, line)
  const used = channels.flatMap(({ columns }) => columns)
  const { unitOf, notes: unitNotes } = settleUnits(used, line)
  const timeIndex = headings.findIndex((heading) => heading.quantity === 'time')
  const timeHeading = headings[timeIndex]
  const taken = new Set([timeIndex, ...used.map((column) => column.index)])
  const ignored = headings.filter((heading, index) => heading.name !== '' && !taken.has(index))
  return {
    time: timeHeading
      ? {
          index: timeIndex,
          name: timeHeading.name,
          unit: timeHeading.unit.family === 'time' ? timeHeading.unit.unit : null,
        }
      : null,
    forces: channels
      .flatMap(({ channel, columns }) =>
        columns.map((column) => ({ index: column.index, name: column.name, unit: unitOf(column), channel })),
      )
      .sort((a, b) => a.index - b.index),
    notes: [
      ...notes,
      ...unitNotes,
      ...(ignored.length > 0 ? [readingNotes.columnsIgnored(ignored.map((heading) => heading.name))] : []),
    ],
  }
}
