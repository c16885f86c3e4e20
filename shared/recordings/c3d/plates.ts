import { ReadFault } from '../errors.ts'
import { listed } from '../safe-text.ts'
import type { AnalogData, Share } from './analog.ts'
import { type PlateAxes, plateAxes, upAxis, type Vector } from './orientation.ts'
import type { Parameters } from './parameters.ts'

export type PlateType = 1 | 2 | 3 | 4

/** A force plate of the file and what its vertical force is made of. */
export interface Plate {
  /** From 1, as the file counts. */
  number: number
  type: PlateType
  /** Labels of the channels that carry its force along its own vertical axis. */
  labels: string[]
  /** Unit that those channels are in. */
  unit: string
  /** The channels whose sum is the force along the laboratory's upward axis. */
  upward: Share[]
  /** False: the file does not say how the plate lies, and its own vertical axis was taken as pointing down. */
  isPlaced: boolean
}

/**
 * A plate's force along its own x, y and z as sums of places in its list of channels (c3d.org user guide,
 * FORCE_PLATFORM:TYPE). Types 1 and 2 give the three at the front; type 3 gives them in pairs and corners; type 4
 * as type 2, in volts, to be multiplied by the calibration matrix.
 */
const FORCES: Record<1 | 2 | 3, readonly [number[], number[], number[]]> = {
  1: [[0], [1], [2]],
  2: [[0], [1], [2]],
  3: [
    [0, 1],
    [2, 3],
    [4, 5, 6, 7],
  ],
}
const CALIBRATED_CHANNELS = 6

const isKnownType = (type: number): type is PlateType => type >= 1 && type <= 4 && Number.isInteger(type)

/** [place in the plate's channels, factor] of its force along one of its own axes. */
function partsAlong(axis: 0 | 1 | 2, type: PlateType, matrix: readonly number[]): [number, number][] {
  if (type !== 4) return FORCES[type][axis].map((place) => [place, 1])
  // Stored with the first dimension fastest: the element of row i and column j stands at i + 6j.
  return Array.from({ length: CALIBRATED_CHANNELS }, (_, j) => [j, matrix[axis + 6 * j] ?? NaN])
}

function cornersOf(all: readonly number[], plate: number): Vector[] {
  return [0, 1, 2, 3].map((corner): Vector => {
    const at = 12 * plate + 3 * corner
    return [all[at] ?? NaN, all[at + 1] ?? NaN, all[at + 2] ?? NaN]
  })
}

function unsupported(type: number, number: number): ReadFault {
  const sentence = `Force plate ${number} of the file is of type ${type}, and only types 1 to 4 are read.`
  return new ReadFault('unsupported-plate-type', sentence, { seen: `FORCE_PLATFORM:TYPE ${type}` })
}

/** Plate-frame forces → the force along the laboratory's upward axis, as one sum of analog channels. */
function upwardShares(
  { type, matrix, channels }: { type: PlateType; matrix: readonly number[]; channels: readonly number[] },
  upInPlate: Vector,
): Share[] {
  const factors = new Map<number, number>()
  for (const axis of [0, 1, 2] as const) {
    for (const [place, factor] of partsAlong(axis, type, matrix)) {
      const channel = channels[place] ?? 0
      const weight = upInPlate[axis] * factor
      if (weight !== 0 && channel > 0) factors.set(channel - 1, (factors.get(channel - 1) ?? 0) + weight)
    }
  }
  return [...factors].map(([index, factor]) => ({ index, factor }))
}

/** Channels, counted from 1, of each plate: CHANNEL(6 or 8, plates), 0 where none. */
function checkedChannels(
  parameters: Parameters,
  plate: number,
  type: PlateType,
  analog: AnalogData,
): number[] {
  const all = parameters.numbers('FORCE_PLATFORM:CHANNEL')
  const [perPlate = 0] = parameters.dimensions('FORCE_PLATFORM:CHANNEL')
  const channels = all.slice(plate * perPlate, (plate + 1) * perPlate)
  const needed = type === 4 ? [0, 1, 2, 3, 4, 5] : FORCES[type][2]
  const wrong = needed.find(
    (place) => !(Number(channels[place]) >= 1 && Number(channels[place]) <= analog.channels.length),
  )
  if (wrong !== undefined) {
    const seen = `FORCE_PLATFORM:CHANNEL ${channels[wrong] ?? 'missing'}`
    const sentence = `Force plate ${plate + 1} of the file names channel ${channels[wrong] ?? 'none'} of ${analog.channels.length}.`
    throw new ReadFault('corrupt-file', sentence, { seen })
  }
  return channels
}

/** The unit of a plate's force channels; a calibration matrix makes newtons of volts. */
function unitOf(type: PlateType, places: number[], channels: number[], analog: AnalogData): string {
  if (type === 4) return 'N'
  const units = new Set(places.map((place) => analog.channels[(channels[place] ?? 0) - 1]?.unit ?? ''))
  return units.size === 1 ? ([...units][0] ?? '') : [...units].join(', ')
}

/**
 * Every force plate of the file.
 * @throws ReadFault `no-force-column`, `unsupported-plate-type`, `corrupt-file`
 */
export function readPlates(parameters: Parameters, analog: AnalogData): Plate[] {
  const used = parameters.number('FORCE_PLATFORM:USED') ?? 0
  if (used === 0) {
    const labels = analog.channels.map(({ label }) => label).filter((label) => label !== '')
    const held = labels.length > 0 ? `; its analog channels are ${listed(labels)}` : ''
    throw new ReadFault('no-force-column', `The file is a C3D file that names no force plate${held}.`)
  }
  const types = parameters.numbers('FORCE_PLATFORM:TYPE')
  const corners = parameters.numbers('FORCE_PLATFORM:CORNERS')
  const matrices = parameters.numbers('FORCE_PLATFORM:CAL_MATRIX')
  const axes = Array.from({ length: used }, (_, plate) => plateAxes(cornersOf(corners, plate)))
  const up = upAxis(
    axes.filter((plate) => plate !== null),
    parameters.text('POINT:Y_SCREEN'),
  )
  const upInPlate = (plate: PlateAxes): Vector => [
    plate.x[up.axis] * up.sign,
    plate.y[up.axis] * up.sign,
    plate.z[up.axis] * up.sign,
  ]
  return axes.map((placed, plate): Plate => {
    const type = types[plate] ?? 0
    if (!isKnownType(type)) throw unsupported(type, plate + 1)
    const channels = checkedChannels(parameters, plate, type, analog)
    const matrix = matrices.slice(36 * plate, 36 * (plate + 1))
    if (type === 4 && matrix.length < 36)
      throw new ReadFault(
        'corrupt-file',
        `Force plate ${plate + 1} of the file lacks its calibration matrix.`,
      )
    const places = type === 4 ? [2] : FORCES[type][2]
    return {
      number: plate + 1,
      type,
      labels: places.map((place) => analog.channels[(channels[place] ?? 0) - 1]?.label ?? ''),
      unit: unitOf(type, places, channels, analog),
      // A plate's own z axis points down (c3d.org user guide), so up is its −z.
      upward: upwardShares({ type, matrix, channels }, placed ? upInPlate(placed) : [0, 0, -1]),
      isPlaced: placed !== null,
    }
  })
}
