/** How a file's text is built. */
export interface DelimitedFormat {
  kind: 'delimited'
  /** A blank stands for any run of blanks and tabs. */
  delimiter: ',' | ';' | '\t' | '|' | ' '
  /** Line of the column headings, counted from 1; null where the file has none. */
  headerLine: number | null
  encoding: 'utf-8' | 'utf-16le' | 'utf-16be' | 'windows-1252'
  byteOrderMark: boolean
  lineBreak: 'LF' | 'CRLF' | 'CR'
  decimalMark: '.' | ','
}

/** Which sheet of a workbook was read. */
export interface WorkbookFormat {
  kind: 'workbook'
  sheet: string
  /** Row of the column headings, counted from 1; null where the sheet has none. */
  headerLine: number | null
}

/** How a C3D file stores its numbers, and the force plates in it. */
export interface C3dFormat {
  kind: 'c3d'
  processor: 'intel' | 'dec' | 'mips'
  storage: 'integer' | 'float'
  plates: { number: number; type: number; labels: string[] }[]
  /** 1: the headings are made by the reader, over a sample a row. */
  headerLine: number | null
}

export type FileFormat = DelimitedFormat | WorkbookFormat | C3dFormat

/** How a file is built, before its headings are found. */
export type TableFormat =
  Omit<DelimitedFormat, 'headerLine'> | Omit<WorkbookFormat, 'headerLine'> | Omit<C3dFormat, 'headerLine'>
