import type { Note } from '../../mechanics/types.ts'
import { ReadFault } from '../errors.ts'
import type { MapRequest, ReadHints, ReadResult } from '../result.ts'
import { proposeMap, readTable } from '../table/read-table.ts'
import { tableOfRows } from '../table/rows-table.ts'
import type { Table } from '../table/table.ts'
import { workbookNotes } from './notes.ts'
import { type PartOf, readParts } from './parts.ts'
import { readSheet } from './sheet.ts'

/** One sheet with cells in it. */
interface OpenSheet {
  name: string
  table: Table
  formulasWithoutResult: number
}

/** The sheets that hold cells, hidden ones last, each read when its turn comes. */
function* sheetsOf(partOf: PartOf): Generator<OpenSheet> {
  const parts = readParts(partOf)
  const inOrder = [...parts.sheets].sort((a, b) => Number(a.isHidden) - Number(b.isHidden))
  for (const { name, path } of inOrder) {
    const bytes = partOf(path)
    if (!bytes) throw new ReadFault('corrupt-file', `The workbook is damaged: its part “${path}” is missing.`)
    const { rows, formulasWithoutResult } = readSheet(bytes, path, parts)
    if (rows.length > 0)
      yield { name, table: tableOfRows(rows, { kind: 'workbook', sheet: name }), formulasWithoutResult }
  }
}

interface Tried {
  sheet: Omit<OpenSheet, 'table'>
  result: ReadResult
}

/** How much a sheet has of a recording: one that is read, one that waits for its map, one with other trouble, none. */
function rank({ result }: Tried): number {
  if (result.ok) return 0
  if (result.needsMap) return 1
  return result.error.code === 'no-header' || result.error.code === 'not-a-recording' ? 3 : 2
}

function withNotes(best: Tried, tried: readonly Tried[]): ReadResult {
  const { sheet, result } = best
  if (!result.ok) return result
  const others = tried.filter((one) => one !== best && one.result.ok).map((one) => one.sheet.name)
  const notes: Note[] = [
    ...result.notes,
    ...(others.length > 0 ? [workbookNotes.otherRecordings(sheet.name, others)] : []),
    ...(sheet.formulasWithoutResult > 0
      ? [workbookNotes.formulasWithoutResult(sheet.formulasWithoutResult)]
      : []),
  ]
  return { ...result, notes, recording: { ...result.recording, notes } }
}

const emptyWorkbook = (): ReadFault => new ReadFault('empty-file', 'The workbook holds no cells.')

/**
 * A workbook → channels of samples: every sheet is looked at, and the first that holds a recording is read.
 * @throws ReadFault where the workbook as a whole cannot be read
 */
export function readWorkbook(partOf: PartOf, hints: ReadHints = {}): ReadResult {
  const tried: Tried[] = []
  for (const { table, ...sheet } of sheetsOf(partOf)) tried.push({ sheet, result: readTable(table, hints) })
  const [first] = tried
  if (!first) throw emptyWorkbook()
  return withNotes(
    tried.reduce((best, one) => (rank(one) < rank(best) ? one : best), first),
    tried,
  )
}

/**
 * What the columns of the sheet with the recording are proposed to be, for a person to confirm or change.
 * @throws ReadFault where no sheet holds a table of numbers
 */
export function proposeWorkbookMap(partOf: PartOf): MapRequest {
  let fault: ReadFault | null = null
  for (const { table } of sheetsOf(partOf)) {
    try {
      return proposeMap(table)
    } catch (error) {
      if (!(error instanceof ReadFault)) throw error
      fault ??= error
    }
  }
  throw fault ?? emptyWorkbook()
}
