import type { Note } from '../../mechanics/types.ts'
import { ReadFault } from '../errors.ts'
import { MAX_FORCE_N } from '../limits.ts'
import { listed } from '../safe-text.ts'
import { readHeading } from '../columns/heading.ts'
import { type AnalogData, readAnalog, sumOfChannels } from './analog.ts'
import type { Processor } from './binary.ts'
import { type C3dHeader, readC3dHeader } from './header.ts'
import { c3dNotes } from './notes.ts'
import { readParameters } from './parameters.ts'
import { type Plate, readPlates } from './plates.ts'

/** The vertical force of each plate of a C3D file as columns under headings, with the time in front. */
export interface C3dColumns {
  processor: Processor
  storage: 'integer' | 'float'
  rateHz: number
  plates: { number: number; type: number; labels: string[] }[]
  /** `Time (s)`, and for each plate a heading with its number, the foot that its label names, and N. */
  headings: string[]
  /** Seconds, then newtons; upward on the athlete is positive. NaN where a sample is no number. */
  columns: Float64Array[]
  notes: Note[]
}

/** Units in which a plate's channels may be, in newtons. */
const IN_NEWTONS = new Map([
  ['n', 1],
  ['newton', 1],
  ['newtons', 1],
  ['kn', 1000],
])

function newtonsOf({ unit, number, labels }: Plate): { factor: number; isAssumed: boolean } {
  if (unit === '') return { factor: 1, isAssumed: true }
  const factor = IN_NEWTONS.get(unit.toLowerCase())
  if (factor !== undefined) return { factor, isAssumed: false }
  const sentence = `The channels ${listed(labels)} of force plate ${number} are in ${listed([unit])}, and only N and kN are read.`
  throw new ReadFault('unit-unknown', sentence, { seen: unit })
}

/** Every label of a plate must name the same foot for it to count. */
function footOf(labels: readonly string[]): 'Left ' | 'Right ' | '' {
  const feet = new Set(labels.map((label) => readHeading(label).foot))
  const [foot] = feet
  if (feet.size !== 1) return ''
  if (foot === 'left') return 'Left '
  return foot === 'right' ? 'Right ' : ''
}

function forceOf(header: C3dHeader, analog: AnalogData, plate: Plate, factor: number): Float64Array {
  const shares = plate.upward.map((share) => ({ ...share, factor: share.factor * factor }))
  const force = sumOfChannels(header, analog, shares)
  const beyond = force.findIndex((newtons) => Math.abs(newtons) > MAX_FORCE_N)
  if (beyond < 0) return force
  const seen = `${force[beyond]} N`
  const sentence = `Sample ${beyond + 1} of force plate ${plate.number} is ${seen}, more than any plate measures.`
  throw new ReadFault('corrupt-file', sentence, { seen })
}

/**
 * Bytes of a C3D file → its plates' vertical forces, by the published specification (c3d.org user guide).
 * @throws ReadFault for whatever the file holds that cannot be read; reads nothing beyond its end
 */
export function readC3dColumns(bytes: Uint8Array): C3dColumns {
  const header = readC3dHeader(bytes)
  const parameters = readParameters(header)
  const analog = readAnalog(header, parameters)
  const plates = readPlates(parameters, analog)
  const notes: Note[] = []
  const forces = plates.map((plate) => {
    const { factor, isAssumed } = newtonsOf(plate)
    if (isAssumed) notes.push(c3dNotes.unitAssumed(plate.number))
    if (plate.type === 4) notes.push(c3dNotes.calibrationMatrix(plate.number))
    if (!plate.isPlaced) notes.push(c3dNotes.plateNotPlaced(plate.number))
    return forceOf(header, analog, plate, factor)
  })
  const time = new Float64Array(analog.frames * analog.samplesPerFrame)
  for (let i = 0; i < time.length; i++) time[i] = i / analog.rateHz
  return {
    processor: header.processor,
    storage: header.isFloat ? 'float' : 'integer',
    rateHz: analog.rateHz,
    plates: plates.map(({ number, type, labels }) => ({ number, type, labels })),
    headings: ['Time (s)', ...plates.map(({ number, labels }) => `${footOf(labels)}Plate ${number} Fz (N)`)],
    columns: [time, ...forces],
    notes,
  }
}
