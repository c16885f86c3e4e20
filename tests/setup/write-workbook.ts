import { writeZip, type ZipEntry } from './write-zip.ts'

/** A cell: text or number as it is, or the XML of a `c` element's inside with its attributes. */
export type WrittenCell = string | number | null | { attributes?: string; inside: string }

export interface WrittenSheet {
  name: string
  rows: WrittenCell[][]
  state?: 'hidden'
  /** XML after the cells, such as merged ones. */
  after?: string
}

const escaped = (text: string): string =>
  text.replace(/&/gu, '&amp;').replace(/</gu, '&lt;').replace(/"/gu, '&quot;')

export function columnName(column: number): string {
  const rest = Math.floor(column / 26)
  return (rest > 0 ? columnName(rest - 1) : '') + String.fromCharCode(65 + (column % 26))
}

function cellXml(cell: WrittenCell, reference: string): string {
  if (cell === null) return ''
  if (typeof cell === 'number') return `<c r="${reference}"><v>${cell}</v></c>`
  if (typeof cell === 'string')
    return `<c r="${reference}" t="inlineStr"><is><t>${escaped(cell)}</t></is></c>`
  return `<c r="${reference}" ${cell.attributes ?? ''}>${cell.inside}</c>`
}

export function sheetXml({ rows, after = '' }: Pick<WrittenSheet, 'rows' | 'after'>): string {
  const data = rows.map(
    (cells, row) =>
      `<row r="${row + 1}">${cells.map((cell, column) => cellXml(cell, columnName(column) + String(row + 1))).join('')}</row>`,
  )
  return `<?xml version="1.0" encoding="UTF-8"?><worksheet xmlns="http://schemas.openxmlformats.org/spreadsheetml/2006/main"><sheetData>${data.join('')}</sheetData>${after}</worksheet>`
}

const RELATIONS = 'http://schemas.openxmlformats.org/officeDocument/2006/relationships'

export interface WorkbookExtras {
  /** Inside `<sst>`. */
  strings?: string
  /** Inside `<styleSheet>`. */
  styles?: string
  properties?: string
  /** Parts in place of, or beside, those that are written. */
  parts?: ZipEntry[]
}

/** A workbook from the published layout (ECMA-376), part by part, without any package. */
export function writeWorkbook(sheets: WrittenSheet[], extras: WorkbookExtras = {}): Uint8Array {
  const list = sheets.map(
    ({ name, state }, i) =>
      `<sheet name="${escaped(name)}" sheetId="${i + 1}"${state ? ` state="${state}"` : ''} r:id="rId${i + 1}"/>`,
  )
  const relations = [
    ...sheets.map(
      (_, i) =>
        `<Relationship Id="rId${i + 1}" Type="${RELATIONS}/worksheet" Target="worksheets/sheet${i + 1}.xml"/>`,
    ),
    `<Relationship Id="rId98" Type="${RELATIONS}/sharedStrings" Target="/xl/sharedStrings.xml"/>`,
    `<Relationship Id="rId99" Type="${RELATIONS}/styles" Target="styles.xml"/>`,
  ]
  const parts: ZipEntry[] = [
    {
      name: '[Content_Types].xml',
      data: '<Types xmlns="http://schemas.openxmlformats.org/package/2006/content-types"/>',
    },
    {
      name: 'xl/workbook.xml',
      data: `<workbook xmlns:r="${RELATIONS}">${extras.properties ?? ''}<sheets>${list.join('')}</sheets></workbook>`,
    },
    { name: 'xl/_rels/workbook.xml.rels', data: `<Relationships>${relations.join('')}</Relationships>` },
    { name: 'xl/sharedStrings.xml', data: `<sst>${extras.strings ?? ''}</sst>` },
    { name: 'xl/styles.xml', data: `<styleSheet>${extras.styles ?? ''}</styleSheet>` },
    ...sheets.map((sheet, i) => ({ name: `xl/worksheets/sheet${i + 1}.xml`, data: sheetXml(sheet) })),
  ]
  const replaced = new Set(extras.parts?.map(({ name }) => name))
  return writeZip([...parts.filter(({ name }) => !replaced.has(name)), ...(extras.parts ?? [])])
}
