import type { Case } from '../case.ts'
import { bothFeet, falling, fixed, gives, jump, plainHead, rising, seconds, table, text, thousandths, utf8 } from './text.ts'
import type { MadeCase } from './text.ts'

const { left, right, rateHz } = jump
const rows = left.length
const time = seconds(rows, rateHz)
const feet = { left, right }
const single = { single: bothFeet }
const total = { total: bothFeet }
const share = (of: number[], factor: number): number[] => of.map((n) => Math.round(n * factor * 100) / 100 + 0)
const minus = (of: number[], by: number): number[] => of.map((n) => Math.round((n - by) * 100) / 100 + 0)
const sum = (...parts: number[][]): number[] => (parts[0] ?? []).map((_, i) => thousandths(parts.reduce((n, part) => n + (part[i] ?? 0), 0)))

/** A file of these columns under a time at 100 Hz. */
const made = (name: string, columns: [heading: string, values: number[]][], expected: Case): MadeCase => ({
  name,
  bytes: table({ head: [['Time (s)', ...columns.map(([heading]) => heading)]], columns: [time, ...columns.map(([, values]) => fixed(values))] }),
  expected,
})
const shear = (of: number[], factor: number): number[] => share(of.map((n, i) => n * Math.sin(i / 9)), factor)
const [fx, fy] = [shear(bothFeet, 0.04), shear(bothFeet, 0.06)]

/** Which axis is vertical. */
const axes: MadeCase[] = [
  made('weight-along-z', [['Fx (N)', fx], ['Fy (N)', fy], ['Fz (N)', bothFeet]], gives(single, rateHz, ['columns-ignored'])),
  made('weight-along-y', [['Fx (N)', fx], ['Fy (N)', bothFeet], ['Fz (N)', fy]], gives(single, rateHz, ['vertical-by-weight', 'columns-ignored'])),
  made('weight-along-minus-x', [['Fx (N)', share(bothFeet, -1)], ['Fy (N)', fy], ['Fz (N)', fx]], gives(single, rateHz, ['vertical-by-weight', 'columns-ignored', 'force-turned-over'])),
  made('three-components-without-axes', [['Force A (N)', fx], ['Force B (N)', bothFeet], ['Force C (N)', fy]], gives(single, rateHz, ['vertical-by-weight', 'columns-ignored'])),
  made(
    'two-plates-with-weight-along-y',
    [['Left Fx (N)', shear(left, 0.05)], ['Left Fy (N)', left], ['Left Fz (N)', shear(left, 0.03)], ['Right Fx (N)', shear(right, 0.05)], ['Right Fy (N)', right], ['Right Fz (N)', shear(right, 0.03)]],
    gives(feet, rateHz, ['vertical-by-weight', 'columns-ignored']),
  ),
  made(
    'six-components-without-axes',
    [['Left 1 (N)', shear(left, 0.05)], ['Left 2 (N)', shear(left, 0.03)], ['Left 3 (N)', left], ['Right 1 (N)', shear(right, 0.05)], ['Right 2 (N)', shear(right, 0.03)], ['Right 3 (N)', right]],
    gives(feet, rateHz, ['vertical-by-weight', 'columns-ignored']),
  ),
  made('vertical-in-words', [['Anterior force (N)', fx], ['Vertical force (N)', bothFeet], ['Medial force (N)', fy]], gives(single, rateHz, ['columns-ignored'])),
  made('two-axes-one-with-the-weight', [['Fx (N)', fx], ['Fy (N)', bothFeet]], gives(single, rateHz, ['vertical-by-weight', 'columns-ignored'])),
]

const corners = [0.3, 0.2, 0.27].map((factor) => share(bothFeet, factor))
const fourth = minus(bothFeet, 0).map((n, i) => Math.round((n - (corners[0]?.[i] ?? 0) - (corners[1]?.[i] ?? 0) - (corners[2]?.[i] ?? 0)) * 100) / 100 + 0)
const heel = { left: share(left, 0.55), right: share(right, 0.45) }
const toe = { left: left.map((n, i) => Math.round((n - (heel.left[i] ?? 0)) * 100) / 100 + 0), right: right.map((n, i) => Math.round((n - (heel.right[i] ?? 0)) * 100) / 100 + 0) }

/** Columns that add up, and totals that must not be added. */
const sums: MadeCase[] = [
  made('four-sensors-of-one-plate', [['Fz1 (N)', corners[0] ?? []], ['Fz2 (N)', corners[1] ?? []], ['Fz3 (N)', corners[2] ?? []], ['Fz4 (N)', fourth]], gives({ single: sum(...corners, fourth) }, rateHz, ['columns-summed'])),
  made('front-and-rear-of-each-foot', [['Left front (N)', heel.left], ['Left rear (N)', toe.left], ['Right front (N)', heel.right], ['Right rear (N)', toe.right]], gives({ left: sum(heel.left, toe.left), right: sum(heel.right, toe.right) }, rateHz, ['columns-summed', 'columns-summed'])),
  made('total-called-so-beside-the-feet', [['Left (N)', left], ['Right (N)', right], ['Sum (N)', bothFeet]], gives(feet, rateHz, ['columns-ignored'])),
  made('total-without-a-name-beside-the-feet', [['Left (N)', left], ['Right (N)', right], ['Force (N)', bothFeet]], gives(feet, rateHz, ['total-not-added'])),
  made('total-before-the-plates', [['F0 (N)', bothFeet], ['F1 (N)', left], ['F2 (N)', right]], gives(total, rateHz, ['feet-unknown', 'total-not-added'])),
  made('total-beside-unnamed-plates', [['Plate 1 (N)', left], ['Plate 2 (N)', right], ['Combined (N)', bothFeet]], gives(total, rateHz, ['columns-ignored'])),
  made('sensors-and-their-total', [['Fz1 (N)', corners[0] ?? []], ['Fz2 (N)', corners[1] ?? []], ['Fz3 (N)', corners[2] ?? []], ['Fz4 (N)', fourth], ['Fz (N)', bothFeet]], gives({ total: sum(...corners, fourth) }, rateHz, ['columns-summed', 'total-not-added'])),
  made('two-plates-that-name-no-foot', [['Plate 1 Fz (N)', left], ['Plate 2 Fz (N)', right]], gives(total, rateHz, ['feet-unknown'])),
  made('heel-and-toe-of-one-foot', [['Left heel (N)', heel.left], ['Left toe (N)', toe.left]], gives({ single: sum(heel.left, toe.left) }, rateHz, ['columns-summed'])),
]

/** Signs and zeros. */
const signs: MadeCase[] = [
  made('pressing-down-reads-negative', [['Left (N)', share(left, -1)], ['Right (N)', share(right, -1)]], gives(feet, rateHz, ['force-turned-over'], { forces: [{ index: 1, unit: 'N', channel: 'left', downward: true }, { index: 2, unit: 'N', channel: 'right', downward: true }] })),
  made('one-plate-reads-negative', [['Left (N)', left], ['Right (N)', share(right, -1)]], gives(feet, rateHz, ['force-turned-over'])),
  made('tared-with-the-athlete-on-it', [['Fz (N)', minus(bothFeet, bothFeet[0] ?? 0)]], gives({ single: minus(bothFeet, bothFeet[0] ?? 0) }, rateHz, ['tared-with-athlete'])),
  made('two-plates-tared-with-the-athlete-on-them', [['Left (N)', minus(left, left[0] ?? 0)], ['Right (N)', minus(right, right[0] ?? 0)]], gives({ left: minus(left, left[0] ?? 0), right: minus(right, right[0] ?? 0) }, rateHz, ['tared-with-athlete'])),
  made('a-zero-a-little-off', [['Fz (N)', minus(bothFeet, 12)]], gives({ single: minus(bothFeet, 12) }, rateHz)),
]

const n = 60
const [long, other] = [rising(n), falling(n)]
const cells = [seconds(n), fixed(long), fixed(other)]
const file = (name: string, content: string, expected: Case): MadeCase => ({ name, bytes: utf8(content), expected })
const changed = (column: string[], changes: Record<number, string>): string[] => column.map((cell, i) => changes[i] ?? cell)
const gap = (filled: number[], notes: string[], count = filled.length): Case => gives({ left: long, right: other }, 1000, notes, { filledSamples: count })
const whole = text({ head: [plainHead], columns: cells })
const upTo = (rowsKept: number): Case => gives({ left: long.slice(0, rowsKept), right: other.slice(0, rowsKept) }, 1000, ['last-line-cut'])

const saturated = long.map((_, i) => 9999 - 200 * Math.max(0, Math.abs(25 - i) - 4))

/** Stray cells, cut ends and gaps. */
const edges: MadeCase[] = [
  file('three-empty-columns-at-the-end', text({ head: [[...plainHead, '', '', '']], columns: [...cells, Array<string>(n).fill(''), Array<string>(n).fill(''), Array<string>(n).fill('')] }), gives({ left: long, right: other }, 1000)),
  file('delimiter-at-the-end-of-rows-only', text({ head: [plainHead], columns: [...cells, Array<string>(n).fill('')] }), gives({ left: long, right: other }, 1000)),
  file('words-beside-the-table', text({ head: [plainHead], columns: [...cells, changed(Array<string>(n).fill(''), { 0: '', 3: 'checked by nobody' }), changed(Array<string>(n).fill(''), { 4: 'second look' })] }), gives({ left: long, right: other }, 1000)),
  file('figures-beside-the-table', text({ head: [[...plainHead, '', 'Best']], columns: [...cells, Array<string>(n).fill(''), changed(Array<string>(n).fill(''), { 0: '0.41', 1: '0.39' })] }), gives({ left: long, right: other }, 1000, ['columns-ignored'])),
  file('text-below-the-table', `${whole}\nEnd of recording\nMade by nobody,2026\n`, gives({ left: long, right: other }, 1000, ['lines-left-out'])),
  file('cut-inside-the-last-number', whole.slice(0, -4), upTo(n - 1)),
  file('cut-between-the-last-cells', whole.slice(0, -8), upTo(n - 1)),
  file('cut-after-a-delimiter', whole.slice(0, -7), upTo(n - 1)),
  file('cut-inside-a-decimal-comma', text({ head: [plainHead], columns: cells.map((column) => column.map((cell) => cell.replace('.', ','))), delimiter: ';' }).slice(0, -2), upTo(n - 1)),
  file('last-line-whole-without-its-end', whole.slice(0, -1), gives({ left: long, right: other }, 1000)),
  file('blank-cells', text({ head: [plainHead], columns: [cells[0] ?? [], changed(cells[1] ?? [], { 20: '', 21: '' }), cells[2] ?? []] }), gap([20, 21], ['samples-filled'])),
  file('not-a-number-in-words', text({ head: [plainHead], columns: [cells[0] ?? [], cells[1] ?? [], changed(cells[2] ?? [], { 30: 'NaN', 31: '#N/A', 40: 'null' })] }), gap([30, 31, 40], ['samples-filled'])),
  file('minus-9999-for-missing', text({ head: [plainHead], columns: [cells[0] ?? [], changed(cells[1] ?? [], { 20: '-9999.00' }), changed(cells[2] ?? [], { 20: '-9999.00' })] }), gap([20], ['sentinels-left-out', 'sentinels-left-out', 'samples-filled'])),
  file('99999-for-missing', text({ head: [plainHead], columns: [cells[0] ?? [], changed(cells[1] ?? [], { 10: '99999', 50: '99999' }), cells[2] ?? []] }), gap([10, 50], ['sentinels-left-out', 'samples-filled'])),
  file('blank-rows-at-both-ends', text({ head: [plainHead], columns: [cells[0] ?? [], changed(cells[1] ?? [], { 0: '', 59: '' }), cells[2] ?? []] }), gives({ left: long.slice(1, 59), right: other.slice(1, 59) }, 1000, ['ends-trimmed'])),
  file('a-quarter-missing', text({ head: [plainHead], columns: [cells[0] ?? [], changed(cells[1] ?? [], Object.fromEntries(Array.from({ length: 15 }, (_, i) => [20 + i, '']))), cells[2] ?? []] }), { error: { code: 'corrupt-file' } }),
  file('missing-sample-numbers-bridged', text({ preamble: ['Rate: 1000 Hz'], head: [['Sample', 'Left (N)', 'Right (N)']], columns: [Array.from({ length: n }, (_, i) => `${i}`), cells[1] ?? [], cells[2] ?? []] }).replace(/^30,.*\n/mu, ''), gap([30], ['metadata-read', 'rate-from-file', 'samples-filled'], 1)),
  file('a-force-of-saturation-is-no-gap',
    text({ head: [['Time (s)', 'Force (N)']], columns: [cells[0] ?? [], fixed(saturated)] }),
    gives({ single: saturated }, 1000),
  ),
]

export const plates: MadeCase[] = [...axes, ...sums, ...signs, ...edges]
