import { describe, expect, it } from 'vitest'
import { makeJump } from '../../../seed/synthetic/jump.ts'
import { seededRandom } from '../../../seed/synthetic/random.ts'
import { recordJump } from '../../../seed/synthetic/record.ts'
import {
  cornersOnFloor,
  type Form,
  type Groups,
  type PlateOfFile,
  sixForms,
  writePlates,
} from '../../../tests/setup/write-c3d.ts'
import { ReadFault } from '../errors.ts'
import { decFloat } from './binary.ts'
import { type C3dColumns, readC3dColumns } from './c3d-columns.ts'

const intel: Form = { processor: 'intel', storage: 'float' }
const zeros = (n: number): number[] => Array<number>(n).fill(0)

/** Channels Fx Fy Fz Mx My Mz of which only Fz is loaded. */
const ofVertical = (fz: number[], name = '1'): Pick<PlateOfFile, 'type' | 'labels' | 'raw'> => ({
  type: 2,
  labels: ['FX', 'FY', 'FZ', 'MX', 'MY', 'MZ'].map((label) => `${label}${name}`),
  raw: [0, 1, 2, 3, 4, 5].map((i) => (i === 2 ? fz : zeros(fz.length))),
})

const forcesOf = (columns: C3dColumns): number[][] => columns.columns.slice(1).map((force) => [...force])

function faultOf(bytes: Uint8Array): ReadFault['readError'] {
  try {
    readC3dColumns(bytes)
  } catch (error) {
    if (error instanceof ReadFault) return error.readError
    throw error
  }
  throw new Error('The file was read, and an error was expected.')
}

describe('numbers of a DEC processor', () => {
  // Bytes and values: the table of the VAX F format in the design's evidence, §12.2.
  it.each([
    [[0x80, 0x40, 0x00, 0x00], 1],
    [[0x80, 0xc0, 0x00, 0x00], -1],
    [[0x20, 0x42, 0x00, 0x00], 10],
    [[0xcc, 0x3e, 0xcd, 0xcc], Math.fround(0.1)],
    [[0x7a, 0x45, 0x00, 0x00], 1000],
    [[0x00, 0x00, 0x12, 0x34], 0],
  ])('%j is %d', ([a = 0, b = 0, c = 0, d = 0], value) => {
    expect(decFloat((b << 24) | (a << 16) | (d << 8) | c)).toBe(value)
  })

  it('have no value where the format reserves them', () => {
    expect(decFloat(0x8000_0000 | 0)).toBeNaN()
  })
})

describe.each(sixForms)('a C3D file ($processor, $storage)', (form) => {
  it('gives the vertical force of two plates, upward positive, and its rate', () => {
    const recording = recordJump(makeJump({ stanceS: 0.3 }), { durationS: 0.8, sampleRateHz: 1000 })
    const { left = [], right = [] } = recording.channels
    // Whole numbers of 1/8 N: the same values in either storage.
    const raw = [left, right].map((force) => Array.from(force, (newtons) => Math.round(8 * newtons)))
    const plates = raw.map((fz, i): PlateOfFile => ({
      ...ofVertical(fz, `${i + 1}`),
      scale: Array<number>(6).fill(-0.125),
    }))
    const read = readC3dColumns(writePlates(plates, form))
    expect(read).toMatchObject({
      ...form,
      rateHz: 1000,
      headings: ['Time (s)', 'Plate 1 Fz (N)', 'Plate 2 Fz (N)'],
      plates: [
        { number: 1, type: 2, labels: ['FZ1'] },
        { number: 2, type: 2, labels: ['FZ2'] },
      ],
      notes: [],
    })
    expect(forcesOf(read)).toStrictEqual(raw.map((force) => force.map((eighths) => eighths / 8)))
    expect(read.columns[0]?.[400]).toBe(0.4)
  })

  it('takes offsets and scales of whole numbers and of floats alike', () => {
    // Example of the evidence, §12.5: raw 3000, offset 2048, scale −1.25 → −1190.0; with a general scale of 20 V over 2^12, scale −256 the same.
    const fz = [3000, 2048, 0, 3000]
    const plate: PlateOfFile = {
      ...ofVertical(fz),
      offset: Array<number>(6).fill(2048),
      scale: Array<number>(6).fill(-1.25),
    }
    expect(forcesOf(readC3dColumns(writePlates([plate], form)))).toStrictEqual([[1190, 0, -2560, 1190]])
    const inVolts = { ...plate, scale: Array<number>(6).fill(-256) }
    const read = readC3dColumns(writePlates([inVolts], { ...form, genScale: 0.0048828125 }))
    expect(forcesOf(read)).toStrictEqual([[1190, 0, -2560, 1190]])
  })

  it('finds the parameters wherever they stand, locked, in any order', () => {
    const plate = ofVertical([-700, -710, -720, -730])
    const read = readC3dColumns(writePlates([plate], { ...form, parametersBlock: 11, groupsLast: true }))
    expect(forcesOf(read)).toStrictEqual([[700, 710, 720, 730]])
  })

  it('adds up the four corners of a plate of type 3', () => {
    const raw = [5, 5, 6, 6, -100, -200, -300, -400].map((value) => [value, value, value, value])
    const labels = ['FX12', 'FX34', 'FY14', 'FY23', 'FZ1', 'FZ2', 'FZ3', 'FZ4']
    const read = readC3dColumns(writePlates([{ type: 3, labels, raw }], form))
    expect(forcesOf(read)).toStrictEqual([[1000, 1000, 1000, 1000]])
    expect(read.plates[0]?.labels).toStrictEqual(['FZ1', 'FZ2', 'FZ3', 'FZ4'])
  })

  it('multiplies the volts of a plate of type 4 by its calibration matrix', () => {
    const calibration = [
      [500, 1, 2, 0, 0, 0],
      [3, 500, 4, 0, 0, 0],
      [5, 6, 1000, 7, 8, 9],
      [0, 0, 0, 200, 0, 0],
      [0, 0, 0, 0, 200, 0],
      [0, 0, 0, 0, 0, 100],
    ]
    const raw = [1, 2, -3, 4, 5, 6].map((volts) => [volts, volts, volts, volts])
    const read = readC3dColumns(
      writePlates(
        [{ ...ofVertical(zeros(4)), type: 4, raw, calibration, units: Array<string>(6).fill('V') }],
        form,
      ),
    )
    // −(5·1 + 6·2 − 1000·3 + 7·4 + 8·5 + 9·6) by hand.
    expect(forcesOf(read)).toStrictEqual([[2861, 2861, 2861, 2861]])
    expect(read.notes.map(({ code }) => code)).toStrictEqual(['calibration-matrix-used'])
  })

  it('takes the third channel of a plate of type 1', () => {
    const plate = {
      ...ofVertical([-640, -641, -642, -643]),
      type: 1,
      labels: ['FX', 'FY', 'FZ', 'PX', 'PY', 'TZ'],
    }
    expect(forcesOf(readC3dColumns(writePlates([plate], form)))).toStrictEqual([[640, 641, 642, 643]])
  })
})

describe('whole numbers without sign', () => {
  it('reach beyond 32,767, and so do their offsets', () => {
    const fz = [40_000, 32_768, 65_535, 0]
    const plate: PlateOfFile = {
      ...ofVertical(fz),
      offset: Array<number>(6).fill(32_768),
      scale: Array<number>(6).fill(-0.1),
    }
    const read = readC3dColumns(
      writePlates([plate], { processor: 'intel', storage: 'integer', format: 'UNSIGNED' }),
    )
    const [force = []] = forcesOf(read)
    expect(force.map((newtons) => Number(newtons.toFixed(3)))).toStrictEqual([723.2, 0, 3276.7, -3276.8])
  })
})

describe('published values', () => {
  it('are those of the guide’s sample 10: steps of 0.08843 N', () => {
    // c3d.org Sample10, TYPE-2.C3D: FX1 [1] = 0.08843, [3] = −0.08843, [1020] = −69.59441, [1021] = −72.24731 (evidence §12.7).
    const raw = [-1, 1, 787, 817]
    const plate: PlateOfFile = { ...ofVertical(raw), scale: Array<number>(6).fill(-0.08843) }
    const [force = []] = forcesOf(
      readC3dColumns(writePlates([plate], { processor: 'intel', storage: 'integer' })),
    )
    const published = [0.08843, -0.08843, -69.59441, -72.24731]
    force.forEach((newtons, i) => expect(-newtons).toBeCloseTo(published[i] ?? NaN, 4))
  })

  it('are those of a public file of type 3: −886.395 N on the plate, 886.3955 N in the laboratory', () => {
    // FP_Type3.c3d: 34 points, 4 samples a frame at 250 Hz, scale −0.03685997, vertical force of plate 1 −886.39541391,
    // −885.77196774, −886.39837178 N and of plate 2 −0.312 N; in the laboratory 886.3955055852457 N (evidence §12.7).
    const vertical = [-886.39541391, -885.77196774, -886.39837178, -886]
    const quarters = vertical.map((newtons) => newtons / 4)
    const labels = Array<string>(8).fill('F')
    const plate = (fz: number[]): PlateOfFile => ({
      type: 3,
      labels,
      raw: [...[0, 0, 0, 0].map(() => zeros(4)), fz, fz, fz, fz],
    })
    const bytes = writePlates([plate(quarters), plate(Array<number>(4).fill(-0.078))], {
      ...intel,
      points: 34,
    })
    const read = readC3dColumns(bytes)
    expect(read.rateHz).toBe(1000)
    forcesOf(read)[0]?.forEach((newtons, i) => expect(newtons).toBeCloseTo(-(vertical[i] ?? 0), 3))
    expect(read.columns[1]?.[0]).toBeCloseTo(886.3955055852457, 3)
    expect(read.columns[2]?.[0]).toBeCloseTo(0.312, 6)
  })
})

describe('a plate', () => {
  const fz = [-700, -700, -700, -700]
  const forceWith = (corners: number[], more: Partial<PlateOfFile> = {}, screen = '+Z'): number | undefined =>
    readC3dColumns(
      writePlates([{ ...ofVertical(fz), corners, ...more }], {
        ...intel,
        more: { POINT: { Y_SCREEN: { chars: [screen] } } },
      }),
    ).columns[1]?.[0]
  const [a, b, c, d] = [0, 3, 6, 9].map((at) => cornersOnFloor(0).slice(at, at + 3)) as [
    number[],
    number[],
    number[],
    number[],
  ]

  it('that points down in the laboratory pushes up with its negative force', () => {
    expect(forceWith([...a, ...b, ...c, ...d])).toBe(700)
  })

  it('that points up pushes up with its positive force', () => {
    expect(forceWith([...b, ...a, ...d, ...c])).toBe(-700)
  })

  it('is upright in a laboratory whose y axis is up', () => {
    const inYUp = ([x = 0, y = 0, z = 0]: number[]): number[] => [x, z, -y]
    expect(forceWith([a, b, c, d].flatMap(inYUp), {}, '+Y')).toBe(700)
  })

  it('is upright in a laboratory whose negative y axis is up', () => {
    const inYDown = ([x = 0, y = 0, z = 0]: number[]): number[] => [x, -z, y]
    expect(forceWith([a, b, c, d].flatMap(inYDown), {}, '-Y')).toBe(700)
  })

  it('that is tilted gives the part of its whole force that points up', () => {
    // 30° about the laboratory's x axis: up is cos 30° of the plate's −z and sin 30° along its x, by hand.
    const [cos, sin] = [Math.cos(Math.PI / 6), Math.sin(Math.PI / 6)]
    const tilted = ([x = 0, y = 0]: number[]): number[] => [x, y * cos, y * sin]
    const raw = [[-100, -100, -100, -100], zeros(4), fz, zeros(4), zeros(4), zeros(4)]
    expect(forceWith([a, b, c, d].flatMap(tilted), { raw })).toBeCloseTo(700 * cos + 100 * sin, 3)
  })

  it('whose place is not given is taken as pointing down, with a note', () => {
    const read = readC3dColumns(writePlates([{ ...ofVertical(fz), corners: zeros(12) }], intel))
    expect(read.columns[1]?.[0]).toBe(700)
    expect(read.notes.map(({ code }) => code)).toStrictEqual(['plate-not-placed'])
  })

  it('has the foot that its label names', () => {
    const plates = ['Left', 'Right'].map((foot, i) => ({
      ...ofVertical(fz),
      labels: Array<string>(6).fill(`${foot} Fz`),
      corners: cornersOnFloor(i),
    }))
    expect(readC3dColumns(writePlates(plates, intel)).headings).toStrictEqual([
      'Time (s)',
      'Left Plate 1 Fz (N)',
      'Right Plate 2 Fz (N)',
    ])
  })

  it('in kilonewtons is turned into newtons, and in no unit taken as newtons with a note', () => {
    const units = (unit: string): Partial<PlateOfFile> => ({ units: Array<string>(6).fill(unit) })
    expect(forceWith(cornersOnFloor(0), units('kN'))).toBe(700_000)
    const silent = readC3dColumns(writePlates([{ ...ofVertical(fz), ...units('') }], intel))
    expect(silent.notes.map(({ code }) => code)).toStrictEqual(['force-unit-assumed'])
  })
})

describe('a C3D file is refused, with what was found', () => {
  const fz = [-700, -700, -700, -700]
  const file = (
    plate: Partial<PlateOfFile> = {},
    options: Partial<Parameters<typeof writePlates>[1]> = {},
  ): Uint8Array => writePlates([{ ...ofVertical(fz), ...plate }], { ...intel, ...options })

  it.each([5, 6, 7, 11, 12, 21, 0])('whose plate is of type %d', (type) => {
    expect(faultOf(file({ type }))).toMatchObject({
      code: 'unsupported-plate-type',
      sentence: `Force plate 1 of the file is of type ${type}, and only types 1 to 4 are read.`,
    })
  })

  it('without a force plate, naming its channels', () => {
    expect(faultOf(file({}, { more: { FORCE_PLATFORM: { USED: { int16: [0] } } } }))).toMatchObject({
      code: 'no-force-column',
      sentence: expect.stringContaining('“FX1”, “FY1”, “FZ1”') as string,
    })
  })

  it.each([
    [
      'a channel that is not there',
      { FORCE_PLATFORM: { CHANNEL: { int16: [1, 2, 9, 4, 5, 6], dimensions: [6, 1] } } },
    ],
    ['another number of channels than its header', { ANALOG: { '!USED': { int16: [7] } } }],
    ['too few scales', { ANALOG: { SCALE: { float: [1, 1] } } }],
    ['no calibration matrix for type 4', { FORCE_PLATFORM: { TYPE: { int16: [4] } } }],
  ])('that names %s', (_, more) => {
    expect(faultOf(file({}, { more })).code).toBe('corrupt-file')
  })

  it('that ends before its last frame', () => {
    const bytes = writePlates([ofVertical(Array<number>(800).fill(-700))], intel)
    expect(faultOf(bytes.slice(0, -1024))).toMatchObject({
      code: 'corrupt-file',
      sentence: expect.stringMatching(
        /^The file says that it holds 200 frames, and ends after 19\d\.$/u,
      ) as string,
    })
  })

  it('with a unit that is no force', () => {
    expect(faultOf(file({ units: Array<string>(6).fill('V') }))).toMatchObject({
      code: 'unit-unknown',
      seen: 'V',
    })
  })

  it('with two sampling rates, or none', () => {
    expect(faultOf(file({}, { more: { ANALOG: { RATE: { float: [100] } } } })).sentence).toContain(
      '100 Hz and 1000 Hz',
    )
    const none = file({}, { frameRateHz: 0 })
    expect(faultOf(none).code).toBe('rate-unknown')
  })

  it('with a force of no plate', () => {
    expect(
      faultOf(file({ raw: [0, 0, 1e9, 0, 0, 0].map((value) => [value, value, value, value]) })),
    ).toMatchObject({ code: 'corrupt-file' })
  })

  it('with more samples than are read, before any memory is taken for them', () => {
    const bytes = file()
    const view = new DataView(bytes.buffer)
    view.setUint16(2 * 2, 6 * 40_000, true)
    expect(faultOf(bytes).code).toBe('corrupt-file')
  })
})

describe('frames', () => {
  it('are counted by their length where 16 bits cannot hold the count', () => {
    const frames = 66_000
    const plate = ofVertical(Array<number>(frames).fill(-700))
    const options = {
      processor: 'intel',
      storage: 'integer',
      points: 0,
      samplesPerFrame: 1,
      frameRateHz: 1000,
    } as const
    const counts: Groups[] = [
      {},
      { POINT: { LONG_FRAMES: { float: [frames] } } },
      { POINT: { FRAMES: { int16: [frames % 65_536] }, LONG_FRAMES: { float: [frames] } } },
      { TRIAL: { ACTUAL_START_FIELD: { int16: [1, 0] }, ACTUAL_END_FIELD: { int16: [frames % 65_536, 1] } } },
    ]
    for (const more of counts) {
      const { length = 0 } = readC3dColumns(writePlates([plate], { ...options, more })).columns[1] ?? []
      // Without any count, zeros that fill up the last block may be read as frames.
      expect(length).toBeGreaterThanOrEqual(frames)
      expect(length).toBeLessThan(frames + 512 / 12)
    }
  })
})

describe('a C3D file that was cut or changed anywhere', () => {
  it('gives an error of the catalogue or whole columns of one length, and ends', () => {
    const random = seededRandom(1212)
    let read = 0
    for (const form of sixForms) {
      const fz = Array.from({ length: 40 }, (_, i) => -700 - i)
      const whole = writePlates([ofVertical(fz, '1'), ofVertical(fz, '2')], form)
      for (let i = 0; i < 400; i++) {
        const bytes = i % 4 === 0 ? whole.slice(0, Math.floor(random.next() * whole.length)) : whole.slice()
        for (let k = 0; k < i % 4; k++) {
          const at = Math.floor(random.next() * (i % 2 === 0 ? bytes.length : Math.min(1800, bytes.length)))
          bytes[at] = Math.floor(random.next() * 256)
        }
        try {
          const { columns } = readC3dColumns(bytes)
          read++
          expect(new Set(columns.map((column) => column.length)).size).toBe(1)
        } catch (error) {
          if (!(error instanceof ReadFault)) throw error
        }
      }
    }
    expect(read).toBeGreaterThan(500)
  })
})
