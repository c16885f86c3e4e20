import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import type { ReadErrorCode } from '../../../../shared/recordings/errors.ts'
import type { ReadResult } from '../../../../shared/recordings/result.ts'
import { writeWorkbook, type WrittenCell, type WrittenSheet } from '../../../../tests/setup/write-workbook.ts'
import { writeZip } from '../../../../tests/setup/write-zip.ts'
import { proposeMapOfAny, readAnyFile } from './read-any-file.ts'

const heading = ['Time (s)', 'Left (N)', 'Right (N)']
const samples = (
  n: number,
  cell: (i: number, force: number) => WrittenCell = (_, force) => force,
): WrittenCell[][] => Array.from({ length: n }, (_, i) => [i / 1000, cell(i, 350 + i), 340 - i])
const jump = (name: string, more: Partial<WrittenSheet> = {}): WrittenSheet => ({
  name,
  rows: [heading, ...samples(12)],
  ...more,
})
const notes: WrittenSheet = { name: 'Notes', rows: [['Jumps of an invented club'], ['No numbers here']] }

async function read(bytes: Uint8Array): Promise<ReadResult> {
  const result = await readAnyFile(bytes, 'file.xlsx')
  if (result.ok && 'archive' in result) throw new Error('It was taken for an archive.')
  return result
}

async function reading(bytes: Uint8Array): Promise<Extract<ReadResult, { ok: true }>> {
  const result = await read(bytes)
  if (!result.ok) throw new Error(`${result.error.code}: ${result.error.sentence}`)
  return result
}

const codeOf = async (bytes: Uint8Array): Promise<ReadErrorCode | 'read'> => {
  const result = await readAnyFile(bytes, 'file.xlsx')
  return result.ok ? 'read' : result.error.code
}

describe('a workbook', () => {
  it('made by another program is read: the sheet with the recording, below its title', async () => {
    // two-sheets.xlsx: written with the package exceljs 4.4.0, invented numbers.
    const { recording, format } = await reading(
      new Uint8Array(readFileSync('tests/cases/workbooks/two-sheets.xlsx')),
    )
    expect(format).toStrictEqual({ kind: 'workbook', sheet: 'Jump 1', headerLine: 3 })
    expect(recording.sampleRateHz).toBe(1000)
    // One force is text that is a number, one is a formula with its result.
    expect([...(recording.channels.left ?? [])]).toStrictEqual([
      350, 351, 352, 353, 354, 355.25, 356, 357, 358, 359, 360, 361,
    ])
    expect([...(recording.channels.right ?? [])].slice(2, 5)).toStrictEqual([338, 353.5, 336])
  })

  it('is read from the first sheet with a recording, and names the others', async () => {
    const { format, notes: said } = await reading(writeWorkbook([notes, jump('One'), jump('Two')]))
    expect(format).toMatchObject({ sheet: 'One' })
    expect(said).toMatchObject([
      { code: 'other-sheets-not-read', sentence: expect.stringContaining('“Two”') as string },
    ])
  })

  it('is read from a hidden sheet only where none that is shown holds a recording', async () => {
    const hidden = jump('Hidden', { state: 'hidden' })
    expect((await reading(writeWorkbook([hidden, jump('Shown')]))).format).toMatchObject({ sheet: 'Shown' })
    expect((await reading(writeWorkbook([hidden, notes]))).format).toMatchObject({ sheet: 'Hidden' })
  })

  it('with a clock of times of day, decimal commas in texts, and headings merged over columns', async () => {
    const rows: WrittenCell[][] = [
      ['Clock', 'Left', null, 'Right', null],
      [null, 'Fy (N)', 'Fz (N)', 'Fy (N)', 'Fz (N)'],
      ...Array.from({ length: 20 }, (_, i): WrittenCell[] => [
        { attributes: 's="1"', inside: `<v>${(36_000 + i / 1000) / 86_400}</v>` },
        1,
        `${350 + i},5`,
        2,
        340 - i,
      ]),
    ]
    const { recording } = await reading(
      writeWorkbook(
        [
          {
            name: 'Data',
            rows,
            after: '<mergeCells><mergeCell ref="B1:C1"/><mergeCell ref="D1:E1"/></mergeCells>',
          },
        ],
        {
          styles: '<cellXfs><xf numFmtId="0"/><xf numFmtId="21"/></cellXfs>',
        },
      ),
    )
    expect(recording.sampleRateHz).toBe(1000)
    expect(recording.channels.left?.[3]).toBe(353.5)
    expect(recording.channels.right?.[3]).toBe(337)
  })

  it('says how many formulas it holds no result of', async () => {
    const rows = [heading, ...samples(40, (i, force) => (i === 7 ? { inside: '<f>B3</f>' } : force))]
    const { notes: said, recording } = await reading(writeWorkbook([{ name: 'Data', rows }]))
    expect(said.map(({ code }) => code)).toContain('formulas-without-result')
    expect(recording.filledSamples).toBe(1)
  })

  it('waits for its map where only a person can say what the columns are', async () => {
    const rows = [
      ['Time (s)', 'A', 'B', 'C'],
      ...Array.from({ length: 12 }, (_, i) => [i / 1000, 700 + i, 5, 9]),
    ]
    const result = await read(writeWorkbook([notes, { name: 'Data', rows }]))
    expect(result).toMatchObject({ ok: false, needsMap: { format: { kind: 'workbook', sheet: 'Data' } } })
    expect(await proposeMapOfAny(writeWorkbook([notes, { name: 'Data', rows }]))).toMatchObject({
      ok: true,
      request: { preview: { headings: ['Time (s)', 'A', 'B', 'C'] } },
    })
  })

  it.each<[string, ReadErrorCode, Uint8Array]>([
    ['without a cell', 'empty-file', writeWorkbook([{ name: 'Empty', rows: [] }])],
    ['without a sheet', 'empty-file', writeWorkbook([])],
    ['of words alone', 'no-header', writeWorkbook([notes])],
    [
      'without its sheet',
      'corrupt-file',
      writeWorkbook([jump('One')], {
        parts: [
          {
            name: 'xl/_rels/workbook.xml.rels',
            data: '<Relationships><Relationship Id="rId1" Type="x/worksheet" Target="worksheets/gone.xml"/></Relationships>',
          },
        ],
      }),
    ],
    [
      'with a damaged sheet',
      'corrupt-file',
      writeWorkbook([jump('One')], {
        parts: [{ name: 'xl/worksheets/sheet1.xml', data: '<worksheet><sheetData><row' }],
      }),
    ],
    [
      'that declares entities',
      'corrupt-file',
      writeWorkbook([jump('One')], {
        parts: [
          {
            name: 'xl/sharedStrings.xml',
            data: '<!DOCTYPE sst [<!ENTITY a "aaaa"><!ENTITY b "&a;&a;&a;&a;">]><sst><si><t>&b;</t></si></sst>',
          },
        ],
      }),
    ],
    [
      'whose sheet unfolds without end',
      'unsafe-archive',
      writeWorkbook([jump('One')], {
        parts: [
          {
            name: 'xl/worksheets/sheet1.xml',
            data: `<worksheet>${' '.repeat(32 * 1024 * 1024)}</worksheet>`,
          },
        ],
      }),
    ],
    [
      'with a part that leads outside',
      'unsafe-archive',
      writeWorkbook([jump('One')], { parts: [{ name: '../../outside.xml', data: 'x' }] }),
    ],
    ['in its binary form', 'not-a-recording', writeZip([{ name: 'xl/workbook.bin', data: 'x' }])],
    ['of another standard', 'not-a-recording', writeZip([{ name: 'META-INF/manifest.xml', data: 'x' }])],
  ])('%s is refused', async (_, code, bytes) => {
    expect(await codeOf(bytes)).toBe(code)
  })
})

describe('a relation of a workbook', () => {
  it('to a place outside the file is not followed', async () => {
    const bytes = writeWorkbook([jump('One')], {
      parts: [
        {
          name: 'xl/_rels/workbook.xml.rels',
          data: '<Relationships><Relationship Id="rId1" Type="x/worksheet" Target="http://192.0.2.1/sheet.xml" TargetMode="External"/></Relationships>',
        },
      ],
    })
    expect(await codeOf(bytes)).toBe('empty-file')
  })
})
