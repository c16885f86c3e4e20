import { MAX_SAMPLES } from '../limits.ts'

/** The columns asked for, one array each, all of one length; NaN where a cell is blank. */
export type NumberColumns = Float64Array[]

const [QUOTE, PLUS, MINUS, POINT, SPACE, CR, LF] = [0x22, 0x2b, 0x2d, 0x2e, 0x20, 0x0d, 0x0a]
const [ZERO, NINE, UPPER_E, LOWER_E] = [0x30, 0x39, 0x45, 0x65]

/**
 * Powers of ten that a double holds exactly. A whole number below 2^53 times or over one of them is one rounding
 * of the true value, so it has the very bits that the language's own reading of the text gives.
 */
const POWERS = Float64Array.from({ length: 23 }, (_, exponent) => Number(`1e${exponent}`))

/** Digits that always stay below 2^53. */
const SAFE_DIGITS = 15

/** Characters of the longest number that is read. */
const LONGEST_NUMBER = 400

/** Reads one file's body of plain numbers byte by byte; stops at whatever else it meets. */
class BodyScanner {
  private readonly bytes: Uint8Array
  private readonly delimiter: number
  private at: number
  /** What `number` read last. */
  private value = NaN

  constructor(bytes: Uint8Array, start: number, delimiter: number) {
    this.bytes = bytes
    this.at = start
    this.delimiter = delimiter
  }

  /** Fills `columns` (ascending column indices) row by row, or answers null when the body is not plain. */
  scan(wanted: readonly number[]): NumberColumns | null {
    let capacity = 4096
    let columns: NumberColumns = wanted.map(() => new Float64Array(capacity))
    let rows = 0
    const lastWanted = wanted[wanted.length - 1] ?? 0
    while (this.skipEmptyLines()) {
      if (rows > MAX_SAMPLES) break
      if (rows === capacity) {
        capacity *= 2
        columns = columns.map((column) => grown(column, capacity))
      }
      let next = 0
      for (let index = 0; index <= lastWanted; index++) {
        if (index > 0 && !this.passDelimiter()) return null
        if (index === wanted[next]) {
          if (!this.number()) return null
          const column = columns[next++]
          if (column) column[rows] = this.value
        } else if (!this.skipCell()) return null
      }
      if (!this.skipToLineEnd()) return null
      rows++
    }
    return columns.map((column) => column.slice(0, rows))
  }

  /** True when a row begins here, false at the end of the file. */
  private skipEmptyLines(): boolean {
    while (this.at < this.bytes.length && isLineEnd(this.bytes[this.at])) this.at++
    return this.at < this.bytes.length
  }

  private passDelimiter(): boolean {
    if (this.bytes[this.at] !== this.delimiter) return false
    this.at++
    return true
  }

  private skipCell(): boolean {
    const { bytes, delimiter } = this
    for (; this.at < bytes.length; this.at++) {
      const byte = bytes[this.at]
      if (byte === QUOTE) return false
      if (byte === delimiter || byte === LF || byte === CR) return true
    }
    return true
  }

  private skipToLineEnd(): boolean {
    const { bytes } = this
    for (; this.at < bytes.length; this.at++) {
      const byte = bytes[this.at]
      if (byte === QUOTE) return false
      if (byte === LF || byte === CR) return true
    }
    return true
  }

  /** Reads a number or a blank into `value`; false when the cell is anything else. */
  private number(): boolean {
    const { bytes, delimiter } = this
    let at = this.at
    while (bytes[at] === SPACE) at++
    const start = at
    const sign = bytes[at]
    if (sign === MINUS || sign === PLUS) at++
    let mantissa = 0
    let digits = 0
    let scale = 0
    let byte = bytes[at]
    for (; byte !== undefined && byte >= ZERO && byte <= NINE; byte = bytes[++at], digits++)
      mantissa = mantissa * 10 + (byte - ZERO)
    if (byte === POINT) {
      byte = bytes[++at]
      for (; byte !== undefined && byte >= ZERO && byte <= NINE; byte = bytes[++at], digits++, scale--)
        mantissa = mantissa * 10 + (byte - ZERO)
    }
    const isBlank = digits === 0 && at === start
    if (digits === 0 && !isBlank) return false
    const mantissaEnd = at
    if (digits > 0 && (byte === LOWER_E || byte === UPPER_E)) at = this.exponentEnd(at)
    const end = at
    while (bytes[at] === SPACE) at++
    const after = bytes[at]
    if (after !== undefined && after !== delimiter && after !== LF && after !== CR) return false
    this.at = at
    if (isBlank) this.value = NaN
    else if (digits > SAFE_DIGITS || end > mantissaEnd) this.value = this.slowly(start, end)
    else this.value = (sign === MINUS ? -mantissa : mantissa) / (POWERS[-scale] ?? 1)
    return isBlank || Number.isFinite(this.value)
  }

  /** The byte after an exponent, or the letter's own place where no exponent follows it. */
  private exponentEnd(letter: number): number {
    const { bytes } = this
    let at = letter + 1
    if (bytes[at] === MINUS || bytes[at] === PLUS) at++
    const first = at
    while ((bytes[at] ?? 0) >= ZERO && (bytes[at] ?? 0) <= NINE) at++
    return at > first ? at : letter
  }

  /** The language's own reading; infinite for what is too long to be a force. */
  private slowly(start: number, end: number): number {
    if (end - start > LONGEST_NUMBER) return Infinity
    return Number(String.fromCharCode(...this.bytes.subarray(start, end)))
  }
}

function isLineEnd(byte: number | undefined): boolean {
  return byte === LF || byte === CR
}

function grown(column: Float64Array, capacity: number): Float64Array {
  const larger = new Float64Array(capacity)
  larger.set(column)
  return larger
}

/**
 * Reads the wanted columns (ascending indices) of a body of plain numbers, about twenty-five times as fast as a
 * general reader. null: the body holds something else (quotes, words, missing cells), and Papa Parse is to read it.
 * Stops after one row more than the limit of samples, so that the caller sees that there were too many.
 */
export function scanNumbers(
  bytes: Uint8Array,
  start: number,
  delimiter: string,
  wanted: readonly number[],
): NumberColumns | null {
  return new BodyScanner(bytes, start, delimiter.charCodeAt(0)).scan(wanted)
}
