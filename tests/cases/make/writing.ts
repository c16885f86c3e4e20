import type { Case } from '../case.ts'
import { falling, fixed, gives, plainHead, rising, seconds, table, text, twoPlates, utf8 } from './text.ts'
import type { Layout, MadeCase } from './text.ts'

const { columns, channels } = twoPlates(12)
const comma = (cells: string[]): string[] => cells.map((cell) => cell.replace('.', ','))
const quoted = (cells: string[]): string[] => cells.map((cell) => `"${cell}"`)
const padded = (cells: string[], width: number): string[] => cells.map((cell) => cell.padStart(width))
const head = [plainHead]

const reads = (format: NonNullable<Case['reading']>['format'], notes: string[] = []): Case =>
  gives(channels, 1000, notes, { format })
const plain = (name: string, layout: Partial<Layout>, expected: Case): MadeCase => ({
  name,
  bytes: table({ head, columns, ...layout }),
  expected,
})

/** Forces above a thousand, so that marks stand in them. */
const large = { left: rising(12).map((n) => n + 900), right: falling(12).map((n) => n + 900) }
const grouped = (values: number[], mark: string, decimal: string): string[] =>
  fixed(values).map((cell) => cell.replace('.', decimal).replace(/^(\d)(\d{3})/u, `$1${mark}$2`))
const marked = (mark: string, decimal: string): string[][] => [
  decimal === ',' ? comma(seconds(12)) : seconds(12),
  grouped(large.left, mark, decimal),
  grouped(large.right, mark, decimal),
]
const readsLarge = (format: NonNullable<Case['reading']>['format']): Case =>
  gives(large, 1000, [], { format })

const utf16 = (content: string, order: 'le' | 'be', mark: boolean): Uint8Array => {
  const bytes = Buffer.from((mark ? '\uFEFF' : '') + content, 'utf16le')
  return new Uint8Array(order === 'be' ? bytes.swap16() : bytes)
}
const wide = text({ head, columns, lineBreak: '\r\n' })
const umlauts = [['Zeit (s)', 'Stärke, links (N)', 'Stärke – rechts (N)']]
const latin1 = (content: string): Uint8Array =>
  Uint8Array.from(Buffer.from(content.replaceAll('–', '\u0096').replaceAll('µ', '\u00B5'), 'latin1'))
const semicolons: Layout = { head: umlauts, columns: columns.map(comma), delimiter: ';' }

/** Delimiters, decimals, marks between thousands, quotes, encodings and line ends. */
export const writing: MadeCase[] = [
  plain(
    'semicolon-decimal-comma',
    { delimiter: ';', columns: columns.map(comma) },
    reads({ delimiter: ';', decimalMark: ',' }),
  ),
  plain(
    'tab-decimal-comma',
    { delimiter: '\t', columns: columns.map(comma) },
    reads({ delimiter: '\t', decimalMark: ',' }),
  ),
  plain(
    'pipe-decimal-comma',
    { delimiter: '|', columns: columns.map(comma) },
    reads({ delimiter: '|', decimalMark: ',' }),
  ),
  plain('semicolon-and-blanks', { delimiter: ' ; ' }, reads({ delimiter: ';' })),
  plain(
    'columns-aligned-by-blanks',
    { delimiter: '  ', columns: columns.map((cells) => padded(cells, 10)) },
    reads({ delimiter: ' ' }),
  ),
  plain(
    'one-blank-between',
    { delimiter: ' ', head: [['Time(s)', 'Left(N)', 'Right(N)']] },
    reads({ delimiter: ' ' }),
  ),
  plain('blanks-and-tabs-mixed', { delimiter: ' \t ' }, reads({ delimiter: '\t' })),
  plain(
    'headings-with-blanks-between-wide-blanks',
    { delimiter: '   ', head: [['Time (s)', 'Left foot force (N)', 'Right foot force (N)']] },
    reads({ delimiter: ' ' }),
  ),
  plain(
    'blanks-and-decimal-comma',
    { delimiter: '   ', columns: columns.map(comma) },
    reads({ delimiter: ' ', decimalMark: ',' }),
  ),
  plain(
    'blanks-before-the-first-column',
    {
      delimiter: ' ',
      columns: [padded(seconds(12), 8), ...columns.slice(1)],
      head: [['   Time(s)', 'Left(N)', 'Right(N)']],
    },
    reads({ delimiter: ' ' }),
  ),
  plain(
    'decimal-commas-in-quotes-between-commas',
    { columns: columns.map(comma).map(quoted) },
    reads({ delimiter: ',', decimalMark: ',' }),
  ),
  plain(
    'all-cells-quoted',
    { head: [quoted(plainHead)], columns: columns.map(quoted) },
    reads({ delimiter: ',' }),
  ),
  plain(
    'line-break-in-a-quoted-heading',
    { head: [['Time (s)', '"Left\n(N)"', '"Right\n(N)"']] },
    reads({ delimiter: ',' }),
  ),
  plain(
    'quote-marks-doubled-in-a-heading',
    { head: [['Time (s)', '"Left ""A"" (N)"', '"Right ""A"" (N)"']] },
    reads({ delimiter: ',' }),
  ),
  plain(
    'thousands-commas-in-quotes',
    { columns: marked(',', '.').map(quoted) },
    readsLarge({ decimalMark: '.' }),
  ),
  plain(
    'thousands-commas-between-tabs',
    { delimiter: '\t', columns: marked(',', '.') },
    readsLarge({ delimiter: '\t', decimalMark: '.' }),
  ),
  plain(
    'thousands-points',
    { delimiter: ';', columns: marked('.', ',') },
    readsLarge({ delimiter: ';', decimalMark: ',' }),
  ),
  plain(
    'thousands-blanks',
    { delimiter: ';', columns: marked(' ', ',') },
    readsLarge({ delimiter: ';', decimalMark: ',' }),
  ),
  plain(
    'thousands-narrow-blanks',
    { delimiter: ';', columns: marked('\u202F', ',') },
    readsLarge({ delimiter: ';', decimalMark: ',' }),
  ),
  plain(
    'thousands-apostrophes',
    { delimiter: '\t', columns: marked("'", '.') },
    readsLarge({ delimiter: '\t', decimalMark: '.' }),
  ),
  {
    name: 'thousands-hard-blanks-in-windows-1252',
    bytes: latin1(text({ head: umlauts, columns: marked('\u00A0', ','), delimiter: ';' })),
    expected: readsLarge({ encoding: 'windows-1252', decimalMark: ',' }),
  },
  {
    name: 'comma-that-could-mark-thousands',
    bytes: table({
      preamble: ['Sampling rate: 1000 Hz'],
      head: [['Sample', 'Force (N)']],
      columns: [
        Array.from({ length: 12 }, (_, i) => `${i}`),
        comma(
          fixed(
            rising(12).map((n) => n + 0.125),
            3,
          ),
        ),
      ],
      delimiter: ';',
    }),
    expected: gives({ single: rising(12).map((n) => n + 0.125) }, 1000, [
      'metadata-read',
      'rate-from-file',
      'decimal-comma-assumed',
    ]),
  },
  {
    name: 'true-minus-signs',
    bytes: table({
      head: [['Time (s)', 'Fx (N)', 'Fz (N)']],
      columns: [
        seconds(12),
        fixed(rising(12)),
        fixed(rising(12).map((n) => n - 405)).map((cell) => cell.replace('-', '\u2212')),
      ],
    }),
    expected: gives({ single: rising(12).map((n) => n - 405) }, 1000, ['columns-ignored']),
  },
  plain(
    'exponents-with-decimal-commas',
    {
      delimiter: ';',
      columns: [
        comma(seconds(12)),
        ...columns.slice(1).map((cells) => comma(cells.map((cell) => Number(cell).toExponential(5)))),
      ],
    },
    reads({ decimalMark: ',' }),
  ),
  plain(
    'signs-on-every-number',
    { columns: [seconds(12), ...columns.slice(1).map((cells) => cells.map((cell) => `+${cell}`))] },
    reads({}),
  ),
  {
    name: 'utf-8-with-a-mark',
    bytes: utf8(`\uFEFF${text({ head, columns })}`),
    expected: reads({ encoding: 'utf-8', byteOrderMark: true }),
  },
  {
    name: 'utf-8-words-without-a-mark',
    bytes: table(semicolons),
    expected: reads({ encoding: 'utf-8', byteOrderMark: false }),
  },
  {
    name: 'utf-16-little-end-first',
    bytes: utf16(wide, 'le', true),
    expected: reads({ encoding: 'utf-16le', byteOrderMark: true, lineBreak: 'CRLF' }),
  },
  {
    name: 'utf-16-big-end-first',
    bytes: utf16(wide, 'be', true),
    expected: reads({ encoding: 'utf-16be', byteOrderMark: true }),
  },
  {
    name: 'utf-16-little-end-first-unmarked',
    bytes: utf16(wide, 'le', false),
    expected: reads({ encoding: 'utf-16le', byteOrderMark: false }),
  },
  {
    name: 'utf-16-big-end-first-unmarked',
    bytes: utf16(wide, 'be', false),
    expected: reads({ encoding: 'utf-16be', byteOrderMark: false }),
  },
  {
    name: 'utf-16-with-decimal-commas',
    bytes: utf16(text(semicolons), 'le', true),
    expected: reads({ encoding: 'utf-16le', decimalMark: ',' }),
  },
  {
    name: 'latin-1',
    bytes: latin1(text({ ...semicolons, head: [['Zeit (s)', 'Stärke links (N)', 'Stärke rechts (N)']] })),
    expected: reads({ encoding: 'windows-1252' }),
  },
  { name: 'windows-1252', bytes: latin1(text(semicolons)), expected: reads({ encoding: 'windows-1252' }) },
  plain('carriage-returns-and-line-feeds', { lineBreak: '\r\n' }, reads({ lineBreak: 'CRLF' })),
  plain(
    'carriage-returns-and-decimal-commas',
    { lineBreak: '\r', delimiter: ';', columns: columns.map(comma) },
    reads({ lineBreak: 'CR', decimalMark: ',' }),
  ),
  plain('empty-line-after-every-row', { lineBreak: '\n\n' }, reads({ lineBreak: 'LF' })),
]
