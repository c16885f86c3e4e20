import type { Note } from '../../mechanics/types.ts'
import { buildRecording, wantedColumns } from '../build/build-recording.ts'
import { contentOf } from '../columns/content.ts'
import type { ColumnContent } from '../columns/content.ts'
import type { Settled } from '../columns/draft.ts'
import { fingerprintOf, plainHeading } from '../columns/fingerprint.ts'
import { readHeading } from '../columns/heading.ts'
import { explainMap } from '../columns/map-proposal.ts'
import { settleMap } from '../columns/settle-map.ts'
import type { Columns } from '../columns/settle-map.ts'
import { ReadFault } from '../errors.ts'
import type { ReadError, ReadErrorCode } from '../errors.ts'
import { readingNotes } from '../notes.ts'
import type { ColumnMap, MappedForce } from '../column-map.ts'
import type { FileFormat } from '../format.ts'
import type { ReadHints } from '../hints.ts'
import type { MapRequest, ReadResult } from '../result.ts'
import { listed, shown } from '../safe-text.ts'
import { numbersAbove } from './layout.ts'
import type { Layout } from './table.ts'
import { readMetadata } from './metadata.ts'
import type { Metadata } from './metadata.ts'
import { previewOf } from './preview.ts'
import type { Table } from './table.ts'

/** Errors that a person can settle by saying what the columns are. */
const SETTLED_BY_MAP: readonly ReadErrorCode[] = [
  'no-header',
  'no-force-column',
  'rate-unknown',
  'unit-unknown',
  'ambiguous-columns',
  'map-mismatch',
]

/** A table whose headings and lines above them have been read; its numbers are read when they are needed. */
interface OpenTable {
  table: Table
  layout: Layout
  columns: Columns
  metadata: Metadata
  format: FileFormat
  fingerprint: string
}

/** Each numeric column is read at most once, and only when the headings do not tell what it is. */
function contentReader(table: Table, { bodyRow, numeric }: Layout): (index: number) => ColumnContent {
  let all: Map<number, ColumnContent> | null = null
  return (index) => {
    all ??= new Map(
      table.numbers(bodyRow, numeric).columns.map((values, i) => [numeric[i] ?? -1, contentOf(values)]),
    )
    return all.get(index) ?? contentOf(new Float64Array(0))
  }
}

/** @throws ReadFault `no-header` where no rows hold numbers */
function open(table: Table): OpenTable {
  const { layout } = table
  if (!layout) throw new ReadFault('no-header', 'No table of numbers under headings was found.')
  const { names, units, headerLine, numeric, preamble } = layout
  refuseCommasAsBoth(table, layout)
  refuseHeadingsAmongNumbers(layout)
  const decimal = table.format.kind === 'delimited' ? table.format.decimalMark : '.'
  // Headings that are fewer than the columns cannot be told to stand over them.
  const named = names.length > (numeric.at(-1) ?? 0) ? names : []
  return {
    table,
    layout,
    columns: {
      headings: named.map((name, index) => readHeading(name, units[index])),
      headerLine: named.length > 0 ? headerLine : null,
      numeric,
      contentOf: contentReader(table, layout),
    },
    metadata: readMetadata(preamble, decimal),
    format: { ...table.format, headerLine },
    fingerprint: fingerprintOf(names, units, numeric.length),
  }
}

function refuseHeadingsAmongNumbers(layout: Layout): void {
  const row = numbersAbove(layout)
  if (!row || layout.headerLine === null) return
  const seen = shown(layout.names.join(' '))
  const sentence = `Line ${layout.headerLine} stands among the numbers and holds headings: “${seen}”.`
  throw new ReadFault('corrupt-file', sentence, { line: layout.headerLine, seen })
}

/** Half as many headings as columns, between commas: each number holds a comma of its own. */
function refuseCommasAsBoth({ format }: Table, { names, numeric, headerLine }: Layout): void {
  if (format.kind !== 'delimited' || format.delimiter !== ',' || names.length === 0) return
  if (names.length * 2 !== numeric.length) return
  const sentence = `There are ${names.length} headings over ${numeric.length} columns of numbers, as if each number had a comma of its own.`
  throw new ReadFault('decimal-comma', sentence, {
    ...(headerLine ? { line: headerLine } : {}),
    seen: shown(names.join(', ')),
  })
}

/** A given map, where it fits the table; its columns go by place and heading. */
function fromMap(map: ColumnMap, { columns }: OpenTable): { forces: MappedForce[]; notes: Note[] } {
  const used = [map.time, map.time?.within, ...map.forces].filter(
    (column) => column !== null && column !== undefined,
  )
  for (const { index, name } of used) {
    const heading = columns.headings[index]?.name ?? ''
    if (
      columns.numeric.includes(index) &&
      (columns.headerLine === null || plainHeading(heading) === plainHeading(name))
    )
      continue
    const sentence = `The map expects numbers under ${listed([name])} in column ${index + 1}, and the file has ${heading === '' ? 'no such column' : listed([heading])} there.`
    throw new ReadFault('map-mismatch', sentence, { column: index + 1 })
  }
  if (map.forces.length === 0) throw new ReadFault('map-mismatch', 'The map names no force column.')
  return { forces: map.forces, notes: [] }
}

function firstRowText({ table, layout }: OpenTable): string {
  const { format } = table
  const delimiter = format.kind === 'delimited' ? format.delimiter : ' '
  return (table.top[layout.bodyRow]?.cells ?? []).join(delimiter)
}

function linesNote(layout: Layout, metadata: Metadata): Note[] {
  const above = layout.preamble.filter((row) => row.kinds.some((kind) => kind !== 'blank'))
  const read = new Set(metadata.lines).size
  const left = above.length - read
  return [
    ...(read > 0 ? [readingNotes.linesRead(read)] : []),
    ...(left > 0 ? [readingNotes.linesBeforeHeader(left)] : []),
  ]
}

/** Reads by a map that is settled: given, or taken from the headings. */
function readSettled(
  opened: OpenTable,
  settled: Pick<Settled, 'notes'> & {
    time: Settled['draft']['time'] | ColumnMap['time']
    forces: MappedForce[]
    sampleRateHz?: number
  },
  hints: ReadHints,
): ReadResult {
  const { table, layout, metadata, format, fingerprint } = opened
  const wanted = wantedColumns(settled)
  const body = table.numbers(layout.bodyRow, wanted)
  const { time, forces, sampleRateHz } = settled
  const rate = sampleRateHz === undefined ? {} : { sampleRateHz }
  const { recording, columnMap } = buildRecording({ time, forces, metadata, hints, ...rate }, body, wanted)
  const notes = [...linesNote(layout, metadata), ...settled.notes, ...recording.notes]
  return { ok: true, recording: { ...recording, notes }, columnMap, format, notes, metadata, fingerprint }
}

function readOpened(opened: OpenTable, hints: ReadHints): ReadResult {
  if (hints.map) {
    const { map } = hints
    const rate = map.sampleRateHz === undefined ? {} : { sampleRateHz: map.sampleRateHz }
    return readSettled(opened, { ...fromMap(map, opened), time: map.time, ...rate }, hints)
  }
  const settled = settleMap(opened.columns, firstRowText(opened))
  if (settled.problem) throw new ReadFault(settled.problem.code, settled.problem.sentence, settled.problem)
  const forces = settled.draft.forces.map((force): MappedForce => ({ ...force, unit: force.unit ?? 'N' }))
  return readSettled(opened, { notes: settled.notes, time: settled.draft.time, forces }, hints)
}

function requestFor(opened: OpenTable): MapRequest {
  const { columns, metadata, format, fingerprint } = opened
  const proposal = explainMap(settleMap(columns, firstRowText(opened)), columns)
  return { proposal, fingerprint, metadata, format, preview: previewOf(opened.table, opened.layout, columns) }
}

/** The error with all that settles it; where even the proposal meets damage, the error alone. */
function withRequest(error: ReadError, opened: OpenTable): ReadResult {
  try {
    return { ok: false, error, needsMap: requestFor(opened) }
  } catch (fault) {
    if (!(fault instanceof ReadFault)) throw fault
    return { ok: false, error: fault.readError }
  }
}

/**
 * A table → channels of samples, by its headings or by the map in `hints`. Where only a person can say what the
 * columns are, the error comes with `needsMap`. Never throws for what a table holds.
 */
export function readTable(table: Table, hints: ReadHints = {}): ReadResult {
  let opened: OpenTable | null = null
  try {
    opened = open(table)
    return readOpened(opened, hints)
  } catch (error) {
    if (!(error instanceof ReadFault)) throw error
    const { readError } = error
    if (!opened || !SETTLED_BY_MAP.includes(readError.code)) return { ok: false, error: readError }
    return withRequest(readError, opened)
  }
}

/**
 * What a table's columns are proposed to be, column by column with reasons, whether or not it needs a person.
 * @throws ReadFault where it holds no table of numbers
 */
export function proposeMap(table: Table): MapRequest {
  return requestFor(open(table))
}
