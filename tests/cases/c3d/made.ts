import { cornersOnFloor, type Form, type PlateOfFile, sixForms, writePlates } from '../../setup/write-c3d.ts'
import type { Case } from '../case.ts'

export interface MadeC3d {
  folder: string
  bytes: Uint8Array
  expected: Case
}

/** Numbered C3D files, written word by word, and what they say by hand: no reader has a part in either. */
export const madeC3d: MadeC3d[] = []

const N = 20
// Whole newtons: nothing of them matters but that they differ.
const one = Array.from({ length: N }, (_, i) => 350 + ((i * 37) % 50))
const two = Array.from({ length: N }, (_, i) => 340 + ((i * 23) % 40))
const zeros = Array<number>(N).fill(0)
const vertical = (fz: number[], names: string[], more: Partial<PlateOfFile> = {}): PlateOfFile => ({
  type: 2,
  labels: names,
  raw: [zeros, zeros, fz, zeros, zeros, zeros],
  ...more,
})
const names = (n: string) => ['FX', 'FY', 'FZ', 'MX', 'MY', 'MZ'].map((x) => x + n)
const neg = (a: number[]) => a.map((x) => -x)
const sum = (a: number[], b: number[]) => a.map((x, i) => x + (b[i] ?? 0))
function put(name: string, bytes: Uint8Array, expected: Case): void {
  const number = String(madeC3d.length + 1).padStart(3, '0')
  madeC3d.push({ folder: `${number}-${name}`, bytes, expected })
}
const reading = (
  channels: NonNullable<Case['reading']>['channels'],
  notes: string[] = [],
  format: object = {},
): Case => ({
  reading: { sampleRateHz: 1000, filledSamples: 0, channels, notes, format: { kind: 'c3d', ...format } },
})
const intel: Form = { processor: 'intel', storage: 'float' }
const intelInt: Form = { processor: 'intel', storage: 'integer' }
for (const form of sixForms)
  put(
    `${form.processor}-${form.storage}`,
    writePlates([vertical(neg(one), names('1')), vertical(neg(two), names('2'))], form),
    reading({ total: sum(one, two) }, ['feet-unknown'], form),
  )
put(
  'feet-in-the-labels',
  writePlates(
    [
      vertical(neg(one), Array<string>(6).fill('Right Fz')),
      vertical(neg(two), Array<string>(6).fill('Left Fz')),
    ],
    intel,
  ),
  reading({ left: two, right: one }),
)
put('one-plate', writePlates([vertical(neg(one), names('1'))], intel), reading({ single: one }))
put(
  'type-1',
  writePlates([vertical(neg(one), ['FX', 'FY', 'FZ', 'PX', 'PY', 'TZ'], { type: 1 })], intelInt),
  reading({ single: one }, [], { plates: [{ number: 1, type: 1, labels: ['FZ'] }] }),
)
const corner = (share: number) => neg(one.map((x) => x * share))
put(
  'type-3-four-corners',
  writePlates(
    [
      {
        type: 3,
        labels: ['FX12', 'FX34', 'FY14', 'FY23', 'FZ1', 'FZ2', 'FZ3', 'FZ4'],
        raw: [zeros, zeros, zeros, zeros, corner(1), corner(2), corner(3), corner(4)],
      },
    ],
    intelInt,
  ),
  reading({ single: one.map((x) => 10 * x) }, [], {
    plates: [{ number: 1, type: 3, labels: ['FZ1', 'FZ2', 'FZ3', 'FZ4'] }],
  }),
)
const cal = [
  [500, 0, 0, 0, 0, 0],
  [0, 500, 0, 0, 0, 0],
  [2, 0, 1000, 0, 0, 0],
  [0, 0, 0, 200, 0, 0],
  [0, 0, 0, 0, 200, 0],
  [0, 0, 0, 0, 0, 100],
]
const volts = Array.from({ length: N }, (_, i) => -(5 + (i % 4)) / 8)
put(
  'type-4-calibration-matrix',
  writePlates(
    [
      {
        type: 4,
        labels: names('1'),
        units: Array<string>(6).fill('V'),
        calibration: cal,
        raw: [zeros.map(() => -0.5), zeros, volts, zeros, zeros, zeros],
      },
    ],
    intel,
  ),
  reading({ single: volts.map((v) => -(2 * -0.5 + 1000 * v)) }, ['calibration-matrix-used']),
)
put(
  'unsigned-offsets',
  writePlates(
    [
      vertical(
        one.map((x) => 32768 - x * 10),
        names('1'),
        { offset: Array<number>(6).fill(32768), scale: [1, 1, 0.125, 1, 1, 1] },
      ),
    ],
    { ...intelInt, format: 'UNSIGNED' },
  ),
  reading({ single: one.map((x) => x * 1.25) }),
)
const flipped = [3, 0, 9, 6].map((at) => cornersOnFloor(0).slice(at, at + 3)).flat()
put(
  'plate-pointing-up',
  writePlates([vertical(one, names('1'), { corners: flipped })], intel),
  reading({ single: one }),
)
const yUp = [0, 3, 6, 9]
  .map((at) => {
    const [x = 0, y = 0, z = 0] = cornersOnFloor(0).slice(at, at + 3)
    return [x, z, -y]
  })
  .flat()
put(
  'laboratory-y-up',
  writePlates([vertical(neg(one), names('1'), { corners: yUp })], {
    ...intel,
    more: { POINT: { Y_SCREEN: { chars: ['+Y'] } } },
  }),
  reading({ single: one }),
)
put(
  'kilonewtons',
  writePlates(
    [
      vertical(neg(one), names('1'), {
        units: Array<string>(6).fill('kN'),
        scale: Array<number>(6).fill(0.0009765625),
      }),
    ],
    intelInt,
  ),
  reading({ single: one.map((x) => Math.round(x * 0.9765625 * 1000) / 1000) }),
)
put(
  'plate-nowhere',
  writePlates([vertical(neg(one), names('1'), { corners: Array<number>(12).fill(0) })], intel),
  reading({ single: one }, ['plate-not-placed']),
)
put(
  'parameters-at-block-11',
  writePlates([vertical(neg(one), names('1'))], {
    processor: 'mips',
    storage: 'integer',
    parametersBlock: 11,
    groupsLast: true,
  }),
  reading({ single: one }),
)
put(
  'pressing-reads-negative',
  writePlates([vertical(one, names('1'))], intel),
  reading({ single: one }, ['force-turned-over']),
)
put('type-5', writePlates([vertical(neg(one), names('1'), { type: 5 })], intel), {
  error: {
    code: 'unsupported-plate-type',
    sentence: 'Force plate 1 of the file is of type 5, and only types 1 to 4 are read.',
  },
})
const long = Array.from({ length: 400 }, (_, i) => -700 - (i % 7))
const whole = writePlates(
  [
    {
      type: 2,
      labels: names('1'),
      raw: [long, long, long, long, long, long].map((x, i) => (i === 2 ? x : x.map(() => 0))),
    },
  ],
  intel,
)
put('cut', whole.slice(0, -2048), { error: { code: 'corrupt-file' } })
put(
  'without-a-plate',
  writePlates([vertical(neg(one), names('1'))], {
    ...intel,
    more: { FORCE_PLATFORM: { USED: { int16: [0] } } },
  }),
  { error: { code: 'no-force-column' } },
)
put(
  'three-plates',
  writePlates(
    [1, 2, 3].map((k) => vertical(neg(one), names(String(k)))),
    intel,
  ),
  { error: { code: 'ambiguous-columns' } },
)
put('volts', writePlates([vertical(neg(one), names('1'), { units: Array<string>(6).fill('V') })], intel), {
  error: { code: 'unit-unknown', seen: 'V' },
})
put(
  'two-rates',
  writePlates([vertical(neg(one), names('1'))], { ...intel, more: { ANALOG: { RATE: { float: [100] } } } }),
  { error: { code: 'rate-unknown', sentence: 'The file gives two sampling rates: 100 Hz and 1000 Hz.' } },
)
put(
  'channel-that-is-not-there',
  writePlates([vertical(neg(one), names('1'))], {
    ...intel,
    more: { FORCE_PLATFORM: { CHANNEL: { int16: [1, 2, 9, 4, 5, 6], dimensions: [6, 1] } } },
  }),
  { error: { code: 'corrupt-file', sentence: 'Force plate 1 of the file names channel 9 of 6.' } },
)
