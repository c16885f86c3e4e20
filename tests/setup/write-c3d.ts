/**
 * Writes a C3D file word by word, straight from the tables of the c3d.org user guide, and on purpose without any
 * code of the reader. Block 1 is the header, blocks 2 on the parameters, then the data.
 */
export type Form = { processor: 'intel' | 'dec' | 'mips'; storage: 'integer' | 'float' }

/** The six ways in which a C3D file stores its numbers. */
export const sixForms: Form[] = (['intel', 'dec', 'mips'] as const).flatMap((processor) => [
  { processor, storage: 'integer' as const },
  { processor, storage: 'float' as const },
])

type Value =
  | { chars: string[]; length?: number }
  | { bytes: number[] }
  | { int16: number[]; dimensions?: number[] }
  | { float: number[]; dimensions?: number[] }

/** GROUP → NAME → value; a name that begins with `!` is written as locked. */
export type Groups = Record<string, Record<string, Value>>

export interface C3dFile extends Form {
  points?: number
  frames: number
  samplesPerFrame: number
  frameRateHz: number
  /** As stored, before scale and offset: channel by channel, a value a sample. */
  raw: number[][]
  groups: Groups
  /** POINT:SCALE of the header; its sign follows the storage. */
  pointScale?: number
  parametersBlock?: number
  /** Writes parameters before the groups they belong to. */
  groupsLast?: boolean
}

const PROCESSOR_CODE = { intel: 84, dec: 85, mips: 86 }

/** A float's bytes: DEC is four times the value in IEEE 754, its two halves swapped. */
function floatBytes(value: number, processor: Form['processor']): Buffer {
  const bytes = Buffer.alloc(4)
  if (processor === 'mips') bytes.writeFloatBE(value)
  else bytes.writeFloatLE(processor === 'dec' ? value * 4 : value)
  if (processor !== 'dec') return bytes
  return value === 0
    ? Buffer.alloc(4)
    : Buffer.from([bytes[2] ?? 0, bytes[3] ?? 0, bytes[0] ?? 0, bytes[1] ?? 0])
}

function wordBytes(value: number, processor: Form['processor']): Buffer {
  const bytes = Buffer.alloc(2)
  if (processor === 'mips') bytes.writeUInt16BE(value & 0xffff)
  else bytes.writeUInt16LE(value & 0xffff)
  return bytes
}

function valueBytes(value: Value, processor: Form['processor']): Buffer {
  if ('chars' in value) {
    const length = value.length ?? Math.max(1, ...value.chars.map((text) => text.length))
    const text = value.chars.map((item) => item.padEnd(length)).join('')
    return Buffer.from([0xff, 2, length, value.chars.length, ...Buffer.from(text, 'latin1')])
  }
  if ('bytes' in value) return Buffer.from([1, 1, value.bytes.length, ...value.bytes])
  const numbers = 'int16' in value ? value.int16 : value.float
  const dimensions = value.dimensions ?? (numbers.length === 1 ? [] : [numbers.length])
  const head = Buffer.from(['int16' in value ? 2 : 4, dimensions.length, ...dimensions])
  const write = 'int16' in value ? wordBytes : floatBytes
  return Buffer.concat([head, ...numbers.map((number) => write(number, processor))])
}

/** One record: length of the name, id, name, offset to the next record (from the offset word), content. */
function record(
  name: string,
  id: number,
  content: Buffer,
  isLast: boolean,
  processor: Form['processor'],
): Buffer {
  const isLocked = name.startsWith('!')
  const plain = Buffer.from(isLocked ? name.slice(1) : name, 'latin1')
  const description = Buffer.from('as written by hand', 'latin1')
  const body = Buffer.concat([content, Buffer.from([description.length]), description])
  const head = Buffer.from([isLocked ? 256 - plain.length : plain.length, id < 0 ? 256 + id : id])
  return Buffer.concat([head, plain, wordBytes(isLast ? 0 : body.length + 2, processor), body])
}

function parameterSection({ processor, groups, groupsLast }: C3dFile): Buffer {
  const names = Object.keys(groups)
  const groupRecords = names.map((name, i) => ({ name, id: -(i + 1), content: Buffer.alloc(0) }))
  const parameterRecords = names.flatMap((group, i) =>
    Object.entries(groups[group] ?? {}).map(([name, value]) => ({
      name,
      id: i + 1,
      content: valueBytes(value, processor),
    })),
  )
  const all = groupsLast ? [...parameterRecords, ...groupRecords] : [...groupRecords, ...parameterRecords]
  const records = all.map(({ name, id, content }, i) =>
    record(name, id, content, i === all.length - 1, processor),
  )
  const body = Buffer.concat([Buffer.from([1, 80, 0, PROCESSOR_CODE[processor]]), ...records])
  const blocks = Math.ceil(body.length / 512)
  body[2] = blocks
  return Buffer.concat([body, Buffer.alloc(blocks * 512 - body.length)])
}

export function writeC3d(file: C3dFile): Uint8Array {
  const { processor, storage, points = 0, frames, samplesPerFrame, raw, parametersBlock = 2 } = file
  const parameters = parameterSection(file)
  const dataBlock = parametersBlock + parameters.length / 512
  const header = Buffer.alloc((parametersBlock - 1) * 512)
  header[0] = parametersBlock
  header[1] = 80
  const word = (w: number, value: number): void => void wordBytes(value, processor).copy(header, 2 * (w - 1))
  const float = (w: number, value: number): void =>
    void floatBytes(value, processor).copy(header, 2 * (w - 1))
  word(2, points)
  word(3, raw.length * samplesPerFrame)
  word(4, 1)
  word(5, Math.min(frames, 65_535))
  float(7, (storage === 'float' ? -1 : 1) * (file.pointScale ?? 0.1))
  word(9, dataBlock)
  word(10, samplesPerFrame)
  float(11, file.frameRateHz)
  const write = storage === 'float' ? floatBytes : wordBytes
  const data: Buffer[] = []
  for (let frame = 0; frame < frames; frame++) {
    for (let i = 0; i < 4 * points; i++) data.push(write(i + 1, processor))
    for (let k = 0; k < samplesPerFrame; k++) {
      for (const channel of raw) data.push(write(channel[frame * samplesPerFrame + k] ?? 0, processor))
    }
  }
  const body = Buffer.concat(data)
  const padding = Buffer.alloc((512 - (body.length % 512)) % 512)
  return new Uint8Array(Buffer.concat([header, parameters, body, padding]))
}

export interface PlateOfFile {
  type: number
  labels: string[]
  units?: string[]
  scale?: number[]
  offset?: number[]
  /** Raw values of each of its channels. */
  raw: number[][]
  /** Corners 1 to 4, each x, y, z; a flat plate whose z points down by default. */
  corners?: number[]
  /** Row by row; written column by column, as the guide has it. */
  calibration?: number[][]
}

/** Corners of a plate of 400 by 600 mm on the floor, z of the laboratory up and that of the plate down. */
export const cornersOnFloor = (x: number): number[] =>
  [[x, 0, 0], [x, 600, 0], [x + 400, 600, 0], [x + 400, 0, 0]].flat() // prettier-ignore

/** A file of plates, with every parameter that the guide asks for. */
export function writePlates(
  plates: PlateOfFile[],
  options: Form &
    Partial<
      Pick<C3dFile, 'points' | 'samplesPerFrame' | 'frameRateHz' | 'parametersBlock' | 'groupsLast'>
    > & {
      genScale?: number
      format?: string
      more?: Groups
    },
): Uint8Array {
  const { samplesPerFrame = 4, frameRateHz = 250, points = 2, genScale = 1, format, more = {} } = options
  const raw = plates.flatMap((plate) => plate.raw)
  const frames = Math.floor((raw[0]?.length ?? 0) / samplesPerFrame)
  const perPlate = Math.max(6, ...plates.map((plate) => plate.raw.length))
  let next = 1
  const channels = plates.flatMap((plate) =>
    Array.from({ length: perPlate }, (_, i) => (i < plate.raw.length ? next++ : 0)),
  )
  const each = <T>(of: (plate: PlateOfFile) => T[] | undefined, usual: T): T[] =>
    plates.flatMap((plate) => plate.raw.map((_, i) => of(plate)?.[i] ?? usual))
  const isCalibrated = plates.some((plate) => plate.calibration)
  const groups: Groups = {
    POINT: {
      USED: { int16: [points] },
      SCALE: { float: [options.storage === 'float' ? -0.1 : 0.1] },
      RATE: { float: [frameRateHz] },
      FRAMES: { int16: [Math.min(frames, 65_535)] },
      UNITS: { chars: ['mm'] },
      X_SCREEN: { chars: ['+X'] },
      Y_SCREEN: { chars: ['+Z'] },
      ...more.POINT,
    },
    ANALOG: {
      '!USED': { int16: [raw.length] },
      LABELS: { chars: each((plate) => plate.labels, '') },
      UNITS: { chars: each((plate) => plate.units, 'N') },
      SCALE: { float: each((plate) => plate.scale, 1) },
      OFFSET: { int16: each((plate) => plate.offset, 0) },
      GEN_SCALE: { float: [genScale] },
      RATE: { float: [frameRateHz * samplesPerFrame] },
      ...(format ? { FORMAT: { chars: [format] } } : {}),
      ...more.ANALOG,
    },
    FORCE_PLATFORM: {
      USED: { int16: [plates.length] },
      TYPE: { int16: plates.map((plate) => plate.type) },
      CHANNEL: { int16: channels, dimensions: [perPlate, plates.length] },
      CORNERS: {
        float: plates.flatMap((plate, i) => plate.corners ?? cornersOnFloor(500 * i)),
        dimensions: [3, 4, plates.length],
      },
      ORIGIN: { float: plates.flatMap(() => [0, 0, -40]), dimensions: [3, plates.length] },
      ZERO: { int16: [1, 10] },
      ...(isCalibrated
        ? {
            CAL_MATRIX: {
              float: plates.flatMap((plate) => columnMajor(plate.calibration)),
              dimensions: [6, 6, plates.length],
            },
          }
        : {}),
      ...more.FORCE_PLATFORM,
    },
  }
  return writeC3d({ ...options, points, frames, samplesPerFrame, frameRateHz, raw, groups })
}

function columnMajor(matrix: number[][] = []): number[] {
  return Array.from({ length: 36 }, (_, i) => matrix[i % 6]?.[Math.floor(i / 6)] ?? 0)
}
