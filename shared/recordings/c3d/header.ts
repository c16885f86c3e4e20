import { ReadFault } from '../errors.ts'
import { Binary, type Processor, processorOf } from './binary.ts'

/** Blocks of 512 bytes, counted from 1 (c3d.org user guide, "Basic C3D file structure"). */
export const BLOCK_BYTES = 512
export const startOfBlock = (block: number): number => (block - 1) * BLOCK_BYTES

/** Byte 2 of every C3D file. */
const C3D_KEY = 0x50

/** Parameters stand in block 2, in old files a few blocks later; a picture's first byte is above. */
const LATEST_BLOCK = 127

/** What the first block says; words are counted from 1 in the guide, so word w stands at byte 2(w − 1). */
export interface C3dHeader {
  processor: Processor
  binary: Binary
  /** First byte of the parameter section. */
  parametersAt: number
  /** Points a frame; their words stand before the analog ones. */
  points: number
  /** Analog values a frame: channels × samples a frame. */
  analogPerFrame: number
  firstFrame: number
  lastFrame: number
  /** True: 32-bit floats; false: 16-bit whole numbers. */
  isFloat: boolean
  /** First byte of the data section; null where the header does not say. */
  dataAt: number | null
  /** Analog samples a frame and channel. */
  samplesPerFrame: number
  frameRateHz: number
}

/** True where the first bytes are those of a C3D file: no text has a zero among its first bytes. */
export function isC3d(bytes: Uint8Array): boolean {
  const block = bytes[0] ?? 0
  return (
    bytes[1] === C3D_KEY && block >= 2 && block <= LATEST_BLOCK && bytes.subarray(0, BLOCK_BYTES).includes(0)
  )
}

/** @throws ReadFault `corrupt-file` */
export function readC3dHeader(bytes: Uint8Array): C3dHeader {
  const parametersAt = startOfBlock(bytes[0] ?? 0)
  // The processor stands at byte 4 of the parameter section and must be known before any other number.
  const code = bytes[parametersAt + 3]
  const processor = processorOf(code ?? 0)
  if (!processor || bytes[1] !== C3D_KEY)
    throw new ReadFault(
      'corrupt-file',
      'The file begins as a C3D file, and its parameters do not say which processor wrote it.',
    )
  const binary = new Binary(bytes, processor)
  const word = (w: number): number => binary.uint16(2 * (w - 1))
  const dataBlock = word(9)
  return {
    processor,
    binary,
    parametersAt,
    points: word(2),
    analogPerFrame: word(3),
    firstFrame: word(4),
    lastFrame: word(5),
    isFloat: binary.float32(12) < 0,
    dataAt: dataBlock > 0 ? startOfBlock(dataBlock) : null,
    samplesPerFrame: word(10),
    frameRateHz: binary.float32(20),
  }
}
