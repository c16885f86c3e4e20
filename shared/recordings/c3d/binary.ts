import { ReadFault } from '../errors.ts'

/**
 * Which processor wrote the numbers: byte 4 of the parameter section is 83 and one of these (c3d.org user guide,
 * "The Parameter Section"). DEC keeps whole numbers as Intel does, and real ones in the VAX F format.
 */
export type Processor = 'intel' | 'dec' | 'mips'

const PROCESSORS: Record<number, Processor> = { 84: 'intel', 85: 'dec', 86: 'mips' }

export const processorOf = (code: number): Processor | null => PROCESSORS[code] ?? null

/** The file goes on for less than it says. */
export function cutShort(what: string): ReadFault {
  return new ReadFault('corrupt-file', `The file ends in the middle of ${what}.`)
}

/**
 * A VAX F float from its bits once the two halves are swapped: 0.1m · 2^(e − 128), which is a quarter of what the
 * same bits are in IEEE 754. Exponent 0 is zero, and with the sign set it is the reserved operand: no number.
 */
export function decFloat(bits: number): number {
  const exponent = (bits >>> 23) & 0xff
  const isNegative = bits < 0
  if (exponent === 0) return isNegative ? NaN : 0
  const magnitude = (1 + (bits & 0x7fffff) / 0x800000) * 2 ** (exponent - 129)
  return isNegative ? -magnitude : magnitude
}

/** The bytes of a file under one processor's rules. Every reading is checked against the end of the file. */
export class Binary {
  readonly length: number
  private readonly view: DataView
  private readonly littleEndian: boolean
  private readonly isDec: boolean

  constructor(bytes: Uint8Array, processor: Processor) {
    this.length = bytes.length
    this.view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength)
    this.littleEndian = processor !== 'mips'
    this.isDec = processor === 'dec'
  }

  /** @throws ReadFault `corrupt-file` where `size` bytes from `at` are not all there */
  private check(at: number, size: number): void {
    if (at < 0 || at + size > this.length) throw cutShort('a number')
  }

  uint8(at: number): number {
    this.check(at, 1)
    return this.view.getUint8(at)
  }

  int8(at: number): number {
    this.check(at, 1)
    return this.view.getInt8(at)
  }

  uint16(at: number): number {
    this.check(at, 2)
    return this.view.getUint16(at, this.littleEndian)
  }

  int16(at: number): number {
    this.check(at, 2)
    return this.view.getInt16(at, this.littleEndian)
  }

  float32(at: number): number {
    this.check(at, 4)
    if (!this.isDec) return this.view.getFloat32(at, this.littleEndian)
    return decFloat((this.view.getUint16(at, true) << 16) | this.view.getUint16(at + 2, true))
  }

  /** `length` bytes as Latin-1 characters. */
  text(at: number, length: number): string {
    this.check(at, length)
    let text = ''
    for (let i = 0; i < length; i++) text += String.fromCharCode(this.view.getUint8(at + i))
    return text
  }
}
