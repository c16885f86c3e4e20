import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { parseNumbers } from './parse-numbers.ts'
import { scanNumbers } from './scan-numbers.ts'
import type { PlainStyle } from './scan-numbers.ts'

const encode = (text: string): Uint8Array => new TextEncoder().encode(text)
const inCommas: PlainStyle = { delimiter: ',', decimal: '.' }

/** Numbers as programs write them: fixed decimals, full precision, exponents, signs, bare points. */
const numberText = fc.oneof(
  fc
    .tuple(fc.integer({ min: -9_999_999, max: 9_999_999 }), fc.integer({ min: 0, max: 6 }))
    .map(([n, d]) => (n / 10 ** d).toFixed(d)),
  fc.double({ noNaN: true, noDefaultInfinity: true }).map(String),
  fc.double({ noNaN: true, noDefaultInfinity: true, min: -1e5, max: 1e5 }).map((n) => n.toExponential(7)),
  fc.stringMatching(/^[+-]?\d{1,20}\.\d{0,20}$/),
  fc.constantFrom(
    '-0',
    '+5',
    '.5',
    '7.',
    '-.25',
    '00012.50',
    '  3.5 ',
    '123456789012345',
    '1234567890123456',
    '9007199254740993',
    '0.1e1',
    '1E-5',
    '',
  ),
)

const table = fc.record({
  rows: fc.array(fc.tuple(numberText, numberText, numberText), { minLength: 1, maxLength: 30 }),
  style: fc.constantFrom<PlainStyle>(
    inCommas,
    { delimiter: ';', decimal: '.' },
    { delimiter: ';', decimal: ',' },
    { delimiter: '\t', decimal: ',' },
    { delimiter: '|', decimal: '.' },
    { delimiter: ' ', decimal: '.' },
    { delimiter: ' ', decimal: ',' },
  ),
  lineBreak: fc.constantFrom('\n', '\r\n', '\r'),
  gap: fc.constantFrom(' ', '\t', '   ', ' \t '),
  wanted: fc.constantFrom([0], [1], [2], [0, 2], [0, 1, 2]),
})

describe('scanNumbers', () => {
  it('reads the very bits that Papa Parse and the language read', () => {
    fc.assert(
      fc.property(table, ({ rows, style, lineBreak, gap, wanted }) => {
        const { delimiter, decimal } = style
        const written = (text: string): string => {
          // Between runs of blanks a blank cell cannot be told.
          const cell = delimiter === ' ' ? text.trim() || '0' : text
          return cell.replace('.', decimal)
        }
        const between = delimiter === ' ' ? gap : delimiter
        const text = rows.map((row) => row.map(written).join(between)).join(lineBreak)
        const scanned = scanNumbers(encode(text), 0, style, wanted)
        const parsed = parseNumbers(text, style, wanted, 1).columns
        expect(scanned?.map((column) => [...column])).toStrictEqual(parsed.map((column) => [...column]))
      }),
      { seed: 20_480, numRuns: 500 },
    )
  })

  it('grows beyond its first capacity without losing a row', () => {
    const values = Array.from({ length: 10_000 }, (_, i) => i / 8)
    const [column] = scanNumbers(encode(values.join('\n')), 0, inCommas, [0]) ?? []
    expect([...(column ?? [])]).toStrictEqual(values)
  })

  it('skips empty lines and columns that nobody asked for, whatever they hold', () => {
    const bytes = encode('x,1,left\n\ny,2,right\r\n\r\n')
    expect(scanNumbers(bytes, 0, inCommas, [1])).toStrictEqual([Float64Array.of(1, 2)])
  })

  it.each([
    ['a quoted cell', '1,"2"\n'],
    ['a quote in a column that nobody asked for', '1,2,"a,b"\n'],
    ['a word', '1,abc\n'],
    ['a row that ends early', '1,2\n3\n'],
    ['a number with two points', '1,2.3.4\n'],
    ['a decimal comma in another delimiter', '1;2,5\n'],
    ['a lone sign', '1,-\n'],
    ['an exponent without figures', '1,2e\n'],
    ['a number beyond what a double holds', '1,1e999\n'],
    ['a hexadecimal number', '1,0x10\n'],
  ])('hands %s back to the general reader', (_, text) => {
    expect(
      scanNumbers(encode(text), 0, { ...inCommas, delimiter: text.includes(';') ? ';' : ',' }, [0, 1]),
    ).toBeNull()
  })
})

describe('parseNumbers', () => {
  it('reads quoted cells, ragged rows and words for missing samples', () => {
    const read = parseNumbers('"1","2"\n3\nNaN,4\n5,oops\n', inCommas, [0, 1], 10)
    expect(read.columns).toStrictEqual([Float64Array.of(1, 3, NaN, 5), Float64Array.of(2, NaN, 4, NaN)])
    expect(read.firstUnreadable).toStrictEqual({ line: 13, column: 2, seen: 'oops' })
  })

  it('leaves a footer out and says how it begins', () => {
    const { linesAfter, columns } = parseNumbers('1,2\n\nend of recording\nchecked\n', inCommas, [0, 1], 2)
    expect(linesAfter).toStrictEqual({ count: 2, first: 'end of recording' })
    expect(columns[0]).toHaveLength(1)
  })

  it('refuses text between numbers and names its line', () => {
    const read = (): unknown => parseNumbers('1,2\nTime,Force\n3,4\n', inCommas, [0, 1], 2)
    expect(read).toThrow('Line 3 stands among the numbers and holds none: “Time Force”.')
  })
})
