import { describe, expect, it } from 'vitest'
import { sheetXml, type WrittenCell } from '../../../tests/setup/write-workbook.ts'
import { ReadFault } from '../errors.ts'
import { dayNumberText } from './dates.ts'
import { numberKind } from './number-format.ts'
import { readStrings, readStyles } from './parts.ts'
import { placeOf, readSheet, type SheetRows } from './sheet.ts'

const bytes = (text: string): Uint8Array => new TextEncoder().encode(text)
const usual = { strings: ['Time (s)', 'Left'], styles: [], is1904: false }

const read = (rows: WrittenCell[][], after = '', parts: Parameters<typeof readSheet>[2] = usual): SheetRows =>
  readSheet(bytes(sheetXml({ rows, after })), 'sheet1', parts)
const readText = (xml: string): SheetRows => readSheet(bytes(xml), 'sheet1', usual)

function faultOf(run: () => unknown): ReadFault['readError'] {
  try {
    run()
  } catch (error) {
    if (error instanceof ReadFault) return error.readError
    throw error
  }
  throw new Error('It was read, and a fault was expected.')
}

describe('the cells of a sheet', () => {
  it('are numbers, texts and blanks where they stand', () => {
    expect(read([['a', 1, null, 2.5], [], [null, '7']]).rows).toStrictEqual([
      ['a', 1, null, 2.5],
      [],
      [null, '7'],
    ])
  })

  it('are shared texts, results of formulas, and truth as a word', () => {
    const { rows, formulasWithoutResult } = read([
      [
        { attributes: 't="s"', inside: '<v>1</v>' },
        { inside: '<f>A1+1</f><v>3.25</v>' },
        { attributes: 't="str"', inside: '<f>"x"&amp;"y"</f><v>xy</v>' },
        { attributes: 't="b"', inside: '<v>1</v>' },
        { inside: '<f>SUM(A1)</f>' },
        { attributes: 't="e"', inside: '<f>1/0</f><v>#DIV/0!</v>' },
        { attributes: 't="s"', inside: '<v>99</v>' },
        4,
      ],
    ])
    expect(rows).toStrictEqual([['Left', 3.25, 'xy', 'TRUE', null, null, null, 4]])
    expect(formulasWithoutResult).toBe(1)
  })

  it('follow one another where they do not say where they are', () => {
    expect(
      readText(
        '<worksheet><sheetData><row><c><v>1</v></c><c><v>2</v></c></row><row><c><v>3</v></c></row></sheetData></worksheet>',
      ).rows,
    ).toStrictEqual([[1, 2], [3]])
  })

  it('are the same under any prefix', () => {
    expect(
      readText(
        '<x:worksheet xmlns:x="y"><x:sheetData><x:row r="1"><x:c r="B1"><x:v>5</x:v></x:c></x:row></x:sheetData></x:worksheet>',
      ).rows,
    ).toStrictEqual([[null, 5]])
  })

  it('are dates and times of day as text where their format says so', () => {
    const parts = { ...usual, styles: ['number', 'date', 'time', 'date-time'] as const }
    const styled = (value: number, s: number): WrittenCell => ({
      attributes: `s="${s}"`,
      inside: `<v>${value}</v>`,
    })
    // 46357 days from 1899-12-30 are 2026-12-01; 0.4390625 of a day is 10:32:15.
    const { rows } = read(
      [[styled(46357, 0), styled(46357, 1), styled(0.4390625, 2), styled(46357.4390625, 3)]],
      '',
      {
        ...parts,
        styles: [...parts.styles],
      },
    )
    expect(rows).toStrictEqual([[46357, '2026-12-01', '10:32:15.000000', '2026-12-01T10:32:15.000000']])
  })

  it('that are merged over columns of headings stand over each; a title alone stays where it is', () => {
    const { rows } = read(
      [
        ['A title over all', null, null, null],
        [null, 'Left', null, 'Right', null],
        ['Time (s)', 'Fy', 'Fz', 'Fy', 'Fz'],
        [0, 1, 2, 3, 4],
      ],
      '<mergeCells><mergeCell ref="A1:E1"/><mergeCell ref="B2:C2"/><mergeCell ref="D2:XFD2"/><mergeCell ref="nonsense"/></mergeCells>',
    )
    expect(rows.slice(0, 2)).toStrictEqual([['A title over all'], [null, 'Left', 'Left', 'Right', 'Right']])
  })
})

describe('a sheet is refused', () => {
  it('where its XML ends early or declares entities', () => {
    const bomb =
      '<!DOCTYPE x [<!ENTITY a "aaaaaaaaaa"><!ENTITY b "&a;&a;&a;&a;&a;&a;&a;&a;">]><worksheet><sheetData><row><c t="str"><v>&b;</v></c></row></sheetData></worksheet>'
    const outside = '<!DOCTYPE x [<!ENTITY e SYSTEM "file:///etc/passwd">]><worksheet>&e;</worksheet>'
    for (const xml of [
      '<worksheet><sheetData><row>',
      bomb,
      outside,
      '<worksheet>&nothing;</worksheet>',
      'no xml',
    ])
      expect(faultOf(() => readText(xml))).toMatchObject({ code: 'corrupt-file', seen: 'sheet1' })
  })

  it('where a cell far out would fill the memory with blanks', () => {
    const far = (row: number): string => `<row r="${row}"><c r="XFD${row}"><v>1</v></c></row>`
    const xml = `<worksheet><sheetData>${Array.from({ length: 300 }, (_, i) => far(i + 1)).join('')}</sheetData></worksheet>`
    expect(faultOf(() => readText(xml)).code).toBe('too-large')
  })

  it('where cells stand on one another or outside the sheet', () => {
    const row = (inside: string): string => `<worksheet><sheetData>${inside}</sheetData></worksheet>`
    for (const inside of [
      '<row r="2"/><row r="1"/>',
      '<row r="1"><c r="B1"/><c r="A1"/></row>',
      '<row r="1"><c r="A2"/></row>',
      '<row r="99999999"/>',
      '<row r="1"><c r="ZZZ1"/></row>',
      '<row r="x"/>',
    ])
      expect(faultOf(() => readText(row(inside))).code).toBe('corrupt-file')
  })
})

describe('a place on a sheet', () => {
  it.each([
    ['A1', { column: 0, row: 0 }],
    ['Z9', { column: 25, row: 8 }],
    ['AA10', { column: 26, row: 9 }],
    ['XFD1048576', { column: 16_383, row: 1_048_575 }],
    ['XFE1', null],
    ['A0', null],
    ['A1048577', null],
    ['1A', null],
  ])('%s', (reference, place) => {
    expect(placeOf(reference)).toStrictEqual(place)
  })
})

describe('the format of a number', () => {
  it.each([
    [0, undefined, 'number'],
    [2, undefined, 'number'],
    [14, undefined, 'date'],
    [22, undefined, 'date-time'],
    [47, undefined, 'time'],
    [170, 'General', 'number'],
    [170, '0.00E+00', 'number'],
    [170, '#,##0.00" s"', 'number'],
    [170, '0.00\\d', 'number'],
    [170, '[Red]0.0;[Blue]-0.0', 'number'],
    [170, 'dd/mm/yyyy', 'date'],
    [170, 'mmm yy', 'date'],
    [170, 'hh:mm:ss.000', 'time'],
    [170, '[h]:mm:ss', 'time'],
    [170, '[ss].000', 'time'],
    [170, 'yyyy\\-mm\\-dd hh:mm', 'date-time'],
    [170, '[$-409]d/m/yy h:mm AM/PM;@', 'date-time'],
  ])('%d %s is a %s', (id, code, kind) => {
    expect(numberKind(id, code)).toBe(kind)
  })
})

describe('a number of days', () => {
  // Known days: 1970-01-01 is 25569 (usual) and 24107 (from 1904); 2000-02-29 is 36585; 61 is 1900-03-01.
  it.each([
    [25_569, false, '1970-01-01'],
    [24_107, true, '1970-01-01'],
    [36_585, false, '2000-02-29'],
    [61, false, '1900-03-01'],
    [73_050, false, '2099-12-31'],
  ])('%d (1904: %s) is %s', (days, is1904, text) => {
    expect(dayNumberText(days, 'date', is1904)).toBe(text)
  })

  it('keeps stamps of 2000 Hz apart, and hours beyond a day', () => {
    expect(dayNumberText(0.5 + 0.0005 / 86_400, 'time', false)).toBe('12:00:00.000500')
    expect(dayNumberText(1.5, 'time', false)).toBe('36:00:00.000000')
  })

  it('does not lose its day a moment before midnight', () => {
    expect(dayNumberText(25_570 - 2 ** -38, 'date-time', false)).toBe('1970-01-02T00:00:00.000000')
  })
})

describe('texts and styles', () => {
  it('are joined from their runs, without reading aids', () => {
    const xml =
      '<sst><si><t>Time</t></si><si><r><t>Left </t></r><r><t>(N)</t></r></si><si><t>力</t><rPh><t>ちから</t></rPh></si><si/></sst>'
    expect(readStrings(bytes(xml), 'strings')).toStrictEqual(['Time', 'Left (N)', '力', ''])
  })

  it('are those of cells, not those of named styles', () => {
    const xml =
      '<styleSheet><numFmts><numFmt numFmtId="164" formatCode="hh:mm:ss.000"/></numFmts><cellStyleXfs><xf numFmtId="14"/></cellStyleXfs><cellXfs><xf numFmtId="0"/><xf numFmtId="164"/><xf numFmtId="14"/></cellXfs></styleSheet>'
    expect(readStyles(bytes(xml), 'styles')).toStrictEqual(['number', 'time', 'date'])
  })
})
