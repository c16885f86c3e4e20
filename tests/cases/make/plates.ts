import type { Case } from '../case.ts'
import { bothFeet, fixed, gives, jump, seconds, table, thousandths } from './text.ts'
import type { MadeCase } from './text.ts'

const { left, right, rateHz } = jump
const rows = left.length
const time = seconds(rows, rateHz)
const feet = { left, right }
const single = { single: bothFeet }
const total = { total: bothFeet }
const share = (of: number[], factor: number): number[] =>
  of.map((n) => Math.round(n * factor * 100) / 100 + 0)
const minus = (of: number[], by: number): number[] => of.map((n) => Math.round((n - by) * 100) / 100 + 0)
const sum = (...parts: number[][]): number[] =>
  (parts[0] ?? []).map((_, i) => thousandths(parts.reduce((n, part) => n + (part[i] ?? 0), 0)))

/** A file of these columns under a time at 100 Hz. */
const made = (name: string, columns: [heading: string, values: number[]][], expected: Case): MadeCase => ({
  name,
  bytes: table({
    head: [['Time (s)', ...columns.map(([heading]) => heading)]],
    columns: [time, ...columns.map(([, values]) => fixed(values))],
  }),
  expected,
})
const shear = (of: number[], factor: number): number[] =>
  share(
    of.map((n, i) => n * Math.sin(i / 9)),
    factor,
  )
const [fx, fy] = [shear(bothFeet, 0.04), shear(bothFeet, 0.06)]

/** Which axis is vertical. */
const axes: MadeCase[] = [
  made(
    'weight-along-z',
    [
      ['Fx (N)', fx],
      ['Fy (N)', fy],
      ['Fz (N)', bothFeet],
    ],
    gives(single, rateHz, ['columns-ignored']),
  ),
  made(
    'weight-along-y',
    [
      ['Fx (N)', fx],
      ['Fy (N)', bothFeet],
      ['Fz (N)', fy],
    ],
    gives(single, rateHz, ['vertical-by-weight', 'columns-ignored']),
  ),
  made(
    'weight-along-minus-x',
    [
      ['Fx (N)', share(bothFeet, -1)],
      ['Fy (N)', fy],
      ['Fz (N)', fx],
    ],
    gives(single, rateHz, ['vertical-by-weight', 'columns-ignored', 'force-turned-over']),
  ),
  made(
    'three-components-without-axes',
    [
      ['Force A (N)', fx],
      ['Force B (N)', bothFeet],
      ['Force C (N)', fy],
    ],
    gives(single, rateHz, ['vertical-by-weight', 'columns-ignored']),
  ),
  made(
    'two-plates-with-weight-along-y',
    [
      ['Left Fx (N)', shear(left, 0.05)],
      ['Left Fy (N)', left],
      ['Left Fz (N)', shear(left, 0.03)],
      ['Right Fx (N)', shear(right, 0.05)],
      ['Right Fy (N)', right],
      ['Right Fz (N)', shear(right, 0.03)],
    ],
    gives(feet, rateHz, ['vertical-by-weight', 'columns-ignored']),
  ),
  made(
    'six-components-without-axes',
    [
      ['Left 1 (N)', shear(left, 0.05)],
      ['Left 2 (N)', shear(left, 0.03)],
      ['Left 3 (N)', left],
      ['Right 1 (N)', shear(right, 0.05)],
      ['Right 2 (N)', shear(right, 0.03)],
      ['Right 3 (N)', right],
    ],
    gives(feet, rateHz, ['vertical-by-weight', 'columns-ignored']),
  ),
  made(
    'vertical-in-words',
    [
      ['Anterior force (N)', fx],
      ['Vertical force (N)', bothFeet],
      ['Medial force (N)', fy],
    ],
    gives(single, rateHz, ['columns-ignored']),
  ),
  made(
    'two-axes-one-with-the-weight',
    [
      ['Fx (N)', fx],
      ['Fy (N)', bothFeet],
    ],
    gives(single, rateHz, ['vertical-by-weight', 'columns-ignored']),
  ),
]

const corners = [0.3, 0.2, 0.27].map((factor) => share(bothFeet, factor))
const fourth = minus(bothFeet, 0).map(
  (n, i) =>
    Math.round((n - (corners[0]?.[i] ?? 0) - (corners[1]?.[i] ?? 0) - (corners[2]?.[i] ?? 0)) * 100) / 100 +
    0,
)
const heel = { left: share(left, 0.55), right: share(right, 0.45) }
const toe = {
  left: left.map((n, i) => Math.round((n - (heel.left[i] ?? 0)) * 100) / 100 + 0),
  right: right.map((n, i) => Math.round((n - (heel.right[i] ?? 0)) * 100) / 100 + 0),
}

/** Columns that add up, and totals that must not be added. */
const sums: MadeCase[] = [
  made(
    'four-sensors-of-one-plate',
    [
      ['Fz1 (N)', corners[0] ?? []],
      ['Fz2 (N)', corners[1] ?? []],
      ['Fz3 (N)', corners[2] ?? []],
      ['Fz4 (N)', fourth],
    ],
    gives({ single: sum(...corners, fourth) }, rateHz, ['columns-summed']),
  ),
  made(
    'front-and-rear-of-each-foot',
    [
      ['Left front (N)', heel.left],
      ['Left rear (N)', toe.left],
      ['Right front (N)', heel.right],
      ['Right rear (N)', toe.right],
    ],
    gives({ left: sum(heel.left, toe.left), right: sum(heel.right, toe.right) }, rateHz, [
      'columns-summed',
      'columns-summed',
    ]),
  ),
  made(
    'total-called-so-beside-the-feet',
    [
      ['Left (N)', left],
      ['Right (N)', right],
      ['Sum (N)', bothFeet],
    ],
    gives(feet, rateHz, ['columns-ignored']),
  ),
  made(
    'total-without-a-name-beside-the-feet',
    [
      ['Left (N)', left],
      ['Right (N)', right],
      ['Force (N)', bothFeet],
    ],
    gives(feet, rateHz, ['total-not-added']),
  ),
  made(
    'total-before-the-plates',
    [
      ['F0 (N)', bothFeet],
      ['F1 (N)', left],
      ['F2 (N)', right],
    ],
    gives(total, rateHz, ['feet-unknown', 'total-not-added']),
  ),
  made(
    'total-beside-unnamed-plates',
    [
      ['Plate 1 (N)', left],
      ['Plate 2 (N)', right],
      ['Combined (N)', bothFeet],
    ],
    gives(total, rateHz, ['columns-ignored']),
  ),
  made(
    'sensors-and-their-total',
    [
      ['Fz1 (N)', corners[0] ?? []],
      ['Fz2 (N)', corners[1] ?? []],
      ['Fz3 (N)', corners[2] ?? []],
      ['Fz4 (N)', fourth],
      ['Fz (N)', bothFeet],
    ],
    gives({ total: sum(...corners, fourth) }, rateHz, ['columns-summed', 'total-not-added']),
  ),
  made(
    'two-plates-that-name-no-foot',
    [
      ['Plate 1 Fz (N)', left],
      ['Plate 2 Fz (N)', right],
    ],
    gives(total, rateHz, ['feet-unknown']),
  ),
  made(
    'heel-and-toe-of-one-foot',
    [
      ['Left heel (N)', heel.left],
      ['Left toe (N)', toe.left],
    ],
    gives({ single: sum(heel.left, toe.left) }, rateHz, ['columns-summed']),
  ),
]

/** Signs and zeros. */
const signs: MadeCase[] = [
  made(
    'pressing-down-reads-negative',
    [
      ['Left (N)', share(left, -1)],
      ['Right (N)', share(right, -1)],
    ],
    gives(feet, rateHz, ['force-turned-over'], {
      forces: [
        { index: 1, unit: 'N', channel: 'left', downward: true },
        { index: 2, unit: 'N', channel: 'right', downward: true },
      ],
    }),
  ),
  made(
    'one-plate-reads-negative',
    [
      ['Left (N)', left],
      ['Right (N)', share(right, -1)],
    ],
    gives(feet, rateHz, ['force-turned-over']),
  ),
  made(
    'tared-with-the-athlete-on-it',
    [['Fz (N)', minus(bothFeet, bothFeet[0] ?? 0)]],
    gives({ single: minus(bothFeet, bothFeet[0] ?? 0) }, rateHz, ['tared-with-athlete']),
  ),
  made(
    'two-plates-tared-with-the-athlete-on-them',
    [
      ['Left (N)', minus(left, left[0] ?? 0)],
      ['Right (N)', minus(right, right[0] ?? 0)],
    ],
    gives({ left: minus(left, left[0] ?? 0), right: minus(right, right[0] ?? 0) }, rateHz, [
      'tared-with-athlete',
    ]),
  ),
  made(
    'a-zero-a-little-off',
    [['Fz (N)', minus(bothFeet, 12)]],
    gives({ single: minus(bothFeet, 12) }, rateHz),
  ),
]

export const plates: MadeCase[] = [...axes, ...sums, ...signs]
