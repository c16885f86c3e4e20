import { ReadFault } from '../errors.ts'
import { shown } from '../safe-text.ts'
import type { Binary } from './binary.ts'
import { BLOCK_BYTES, type C3dHeader } from './header.ts'

/** The stored types of a parameter, by their code: characters, bytes, 16-bit whole numbers, 32-bit floats. */
const TYPE_BYTES: Record<number, number> = { [-1]: 1, 1: 1, 2: 2, 4: 4 }

interface Parameter {
  /** −1, 1, 2 or 4. */
  type: number
  dimensions: number[]
  /** Elements: the product of the dimensions; 1 for a scalar. */
  count: number
  at: number
}

/** Parameters by `GROUP:NAME`, upper case, read as they are stored, whatever the guide says they should be. */
export class Parameters {
  private readonly binary: Binary
  private readonly byName: ReadonlyMap<string, Parameter>

  constructor(binary: Binary, byName: ReadonlyMap<string, Parameter>) {
    this.binary = binary
    this.byName = byName
  }

  has(name: string): boolean {
    return this.byName.has(name)
  }

  /** All elements, first dimension fastest; whole numbers without sign unless `signed`. Empty where there is none. */
  numbers(name: string, signed = false): number[] {
    const parameter = this.byName.get(name)
    if (!parameter || parameter.type === -1) return []
    const { type, count, at } = parameter
    const { binary } = this
    return Array.from({ length: count }, (_, i) => {
      if (type === 4) return binary.float32(at + 4 * i)
      if (type === 1) return signed ? binary.int8(at + i) : binary.uint8(at + i)
      return signed ? binary.int16(at + 2 * i) : binary.uint16(at + 2 * i)
    })
  }

  number(name: string, signed = false): number | null {
    return this.numbers(name, signed)[0] ?? null
  }

  /** Strings of a character array, its first dimension being their length; trimmed. */
  texts(name: string): string[] {
    const parameter = this.byName.get(name)
    if (!parameter || parameter.type !== -1) return []
    const { count, at } = parameter
    const length = parameter.dimensions[0] ?? 1
    if (length === 0) return []
    return Array.from({ length: Math.floor(count / length) }, (_, i) =>
      shown(this.binary.text(at + i * length, length).split('\0', 1)[0] ?? ''),
    )
  }

  text(name: string): string {
    return this.texts(name)[0] ?? ''
  }

  dimensions(name: string): readonly number[] {
    return this.byName.get(name)?.dimensions ?? []
  }
}

function misplaced(name: string): ReadFault {
  return new ReadFault(
    'corrupt-file',
    `The parameters of the file do not follow one another at “${shown(name)}”.`,
    {
      seen: shown(name),
    },
  )
}

/** One parameter's type, dimensions and place; `at` is the byte after its offset word. */
function parameterAt(binary: Binary, at: number, end: number, name: string): Parameter {
  const type = binary.int8(at)
  const size = TYPE_BYTES[type]
  const rank = binary.uint8(at + 1)
  if (size === undefined || rank > 7) throw misplaced(name)
  const dimensions = Array.from({ length: rank }, (_, i) => binary.uint8(at + 2 + i))
  const count = dimensions.reduce((product, dimension) => product * dimension, 1)
  const dataAt = at + 2 + rank
  if (dataAt + count * size > end) throw misplaced(name)
  return { type, dimensions, count, at: dataAt }
}

/**
 * The parameter section: records of groups and parameters in any order, a parameter even before its group. A
 * negative length of the name says that the record is locked. The offset counts from the offset word to the next
 * record; 0 is the last one.
 * @throws ReadFault `corrupt-file` where the records do not follow one another inside the section
 */
export function readParameters({ binary, parametersAt }: C3dHeader): Parameters {
  const blocks = binary.uint8(parametersAt + 2)
  // Some writers leave the count of blocks at zero: then the section ends with its last record.
  const end = blocks > 0 ? Math.min(parametersAt + blocks * BLOCK_BYTES, binary.length) : binary.length
  const groups = new Map<number, string>()
  const found: { group: number; name: string; parameter: Parameter }[] = []
  let at = parametersAt + 4
  while (at + 2 < end) {
    const nameLength = Math.abs(binary.int8(at))
    if (nameLength === 0) break
    const id = binary.int8(at + 1)
    const name = binary
      .text(at + 2, nameLength)
      .trim()
      .toUpperCase()
    const offsetAt = at + 2 + nameLength
    const offset = binary.uint16(offsetAt)
    if (id < 0) groups.set(-id, name)
    else if (id > 0) found.push({ group: id, name, parameter: parameterAt(binary, offsetAt + 2, end, name) })
    if (offset === 0) break
    // An offset below its own word would lead back, and never end.
    if (offset < 2 || offsetAt + offset > end) throw misplaced(name)
    at = offsetAt + offset
  }
  const byName = new Map<string, Parameter>()
  for (const { group, name, parameter } of found)
    byName.set(`${groups.get(group) ?? group}:${name}`, parameter)
  return new Parameters(binary, byName)
}
