import type { Case } from '../case.ts'
import { falling, fixed, gives, plainHead, rising, seconds, text, utf8 } from './text.ts'
import type { MadeCase } from './text.ts'

const n = 60
const [long, other] = [rising(n), falling(n)]
const cells = [seconds(n), fixed(long), fixed(other)]
const file = (name: string, content: string, expected: Case): MadeCase => ({
  name,
  bytes: utf8(content),
  expected,
})
const changed = (column: string[], changes: Record<number, string>): string[] =>
  column.map((cell, i) => changes[i] ?? cell)
const gap = (filled: number[], notes: string[], count = filled.length): Case =>
  gives({ left: long, right: other }, 1000, notes, { filledSamples: count })
const whole = text({ head: [plainHead], columns: cells })
const upTo = (rowsKept: number): Case =>
  gives({ left: long.slice(0, rowsKept), right: other.slice(0, rowsKept) }, 1000, ['last-line-cut'])

const saturated = long.map((_, i) => 9999 - 200 * Math.max(0, Math.abs(25 - i) - 4))

/** Stray cells, cut ends and gaps. */
export const edges: MadeCase[] = [
  file(
    'three-empty-columns-at-the-end',
    text({
      head: [[...plainHead, '', '', '']],
      columns: [...cells, Array<string>(n).fill(''), Array<string>(n).fill(''), Array<string>(n).fill('')],
    }),
    gives({ left: long, right: other }, 1000),
  ),
  file(
    'delimiter-at-the-end-of-rows-only',
    text({ head: [plainHead], columns: [...cells, Array<string>(n).fill('')] }),
    gives({ left: long, right: other }, 1000),
  ),
  file(
    'words-beside-the-table',
    text({
      head: [plainHead],
      columns: [
        ...cells,
        changed(Array<string>(n).fill(''), { 0: '', 3: 'checked by nobody' }),
        changed(Array<string>(n).fill(''), { 4: 'second look' }),
      ],
    }),
    gives({ left: long, right: other }, 1000),
  ),
  file(
    'figures-beside-the-table',
    text({
      head: [[...plainHead, '', 'Best']],
      columns: [
        ...cells,
        Array<string>(n).fill(''),
        changed(Array<string>(n).fill(''), { 0: '0.41', 1: '0.39' }),
      ],
    }),
    gives({ left: long, right: other }, 1000, ['columns-ignored']),
  ),
  file(
    'text-below-the-table',
    `${whole}\nEnd of recording\nMade by nobody,2026\n`,
    gives({ left: long, right: other }, 1000, ['lines-left-out']),
  ),
  file('cut-inside-the-last-number', whole.slice(0, -4), upTo(n - 1)),
  file('cut-between-the-last-cells', whole.slice(0, -8), upTo(n - 1)),
  file('cut-after-a-delimiter', whole.slice(0, -7), upTo(n - 1)),
  file(
    'cut-inside-a-decimal-comma',
    text({
      head: [plainHead],
      columns: cells.map((column) => column.map((cell) => cell.replace('.', ','))),
      delimiter: ';',
    }).slice(0, -2),
    upTo(n - 1),
  ),
  file('last-line-whole-without-its-end', whole.slice(0, -1), gives({ left: long, right: other }, 1000)),
  file(
    'blank-cells',
    text({
      head: [plainHead],
      columns: [cells[0] ?? [], changed(cells[1] ?? [], { 20: '', 21: '' }), cells[2] ?? []],
    }),
    gap([20, 21], ['samples-filled']),
  ),
  file(
    'not-a-number-in-words',
    text({
      head: [plainHead],
      columns: [
        cells[0] ?? [],
        cells[1] ?? [],
        changed(cells[2] ?? [], { 30: 'NaN', 31: '#N/A', 40: 'null' }),
      ],
    }),
    gap([30, 31, 40], ['samples-filled']),
  ),
  file(
    'minus-9999-for-missing',
    text({
      head: [plainHead],
      columns: [
        cells[0] ?? [],
        changed(cells[1] ?? [], { 20: '-9999.00' }),
        changed(cells[2] ?? [], { 20: '-9999.00' }),
      ],
    }),
    gap([20], ['sentinels-left-out', 'sentinels-left-out', 'samples-filled']),
  ),
  file(
    '99999-for-missing',
    text({
      head: [plainHead],
      columns: [cells[0] ?? [], changed(cells[1] ?? [], { 10: '99999', 50: '99999' }), cells[2] ?? []],
    }),
    gap([10, 50], ['sentinels-left-out', 'samples-filled']),
  ),
  file(
    'blank-rows-at-both-ends',
    text({
      head: [plainHead],
      columns: [cells[0] ?? [], changed(cells[1] ?? [], { 0: '', 59: '' }), cells[2] ?? []],
    }),
    gives({ left: long.slice(1, 59), right: other.slice(1, 59) }, 1000, ['ends-trimmed']),
  ),
  file(
    'a-quarter-missing',
    text({
      head: [plainHead],
      columns: [
        cells[0] ?? [],
        changed(cells[1] ?? [], Object.fromEntries(Array.from({ length: 15 }, (_, i) => [20 + i, '']))),
        cells[2] ?? [],
      ],
    }),
    { error: { code: 'corrupt-file' } },
  ),
  file(
    'missing-sample-numbers-bridged',
    text({
      preamble: ['Rate: 1000 Hz'],
      head: [['Sample', 'Left (N)', 'Right (N)']],
      columns: [Array.from({ length: n }, (_, i) => `${i}`), cells[1] ?? [], cells[2] ?? []],
    }).replace(/^30,.*\n/mu, ''),
    gap([30], ['metadata-read', 'rate-from-file', 'samples-filled'], 1),
  ),
  file(
    'a-force-of-saturation-is-no-gap',
    text({ head: [['Time (s)', 'Force (N)']], columns: [cells[0] ?? [], fixed(saturated)] }),
    gives({ single: saturated }, 1000),
  ),
]
