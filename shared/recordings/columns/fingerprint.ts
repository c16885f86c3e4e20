/** Prime and offset basis of the 64-bit FNV-1a hash (Fowler, Noll, Vo; IETF draft eastlake-fnv). */
const PRIME = 0x100000001b3n
const OFFSET = 0xcbf29ce484222325n

function hash(text: string, from: bigint): bigint {
  let value = from
  for (let i = 0; i < text.length; i++) {
    value = BigInt.asUintN(64, (value ^ BigInt(text.charCodeAt(i))) * PRIME)
  }
  return value
}

/** A heading as it is compared: blanks collapsed, in lower case. */
export function plainHeading(text: string): string {
  return text.normalize('NFC').replace(/\s+/gu, ' ').trim().toLowerCase().slice(0, 200)
}

/**
 * The same 32 characters for every file with the same headings and units, however they are spaced, quoted or
 * delimited; a file without headings goes by its number of columns.
 */
export function fingerprintOf(names: readonly string[], units: readonly string[], columns: number): string {
  const cells = (texts: readonly string[]): string => {
    const plain = texts.map(plainHeading)
    const last = plain.findLastIndex((text) => text !== '')
    return plain.slice(0, last + 1).join('\u001F')
  }
  const head = names.length > 0 ? `${cells(names)}\u001E${cells(units)}` : `${columns}`
  const hex = (value: bigint): string => value.toString(16).padStart(16, '0')
  return hex(hash(head, OFFSET)) + hex(hash(head, hash('columns', OFFSET)))
}
