import type { ForceChannel } from '../../../shared/mechanics/types.ts'
import type { ColumnMap, DelimitedFormat, ForceUnit } from '../../../shared/recordings/result.ts'

/**
 * A second reader of delimited text that shares nothing with the product's: it takes the format and the column map
 * that the product reports, and reads the numbers character by character. It knows no gaps, footers or damage.
 */
export interface SlowReading {
  channels: Partial<Record<ForceChannel, number[]>>
  /** Seconds or counts as they stand in the column of time. */
  stamps: number[] | null
}

const GRAVITY = 9.80665
const NEWTONS: Partial<Record<ForceUnit, number>> = {
  N: 1,
  kN: 1000,
  kgf: GRAVITY,
  lbf: 0.45359237 * GRAVITY,
}

/** Rows of cells behind a line of the text, quotes undone; blank ones are none. */
function cellsOf(text: string, delimiter: string, behindLine: number): string[][] {
  const rows: string[][] = []
  let line = 1
  let [row, cell, quoted, wasQuoted] = [[] as string[], '', false, false]
  const endCell = (): void => {
    row.push(cell)
    cell = ''
    wasQuoted = false
  }
  for (let i = 0; i < text.length; i++) {
    const character = text.charAt(i)
    if (quoted) {
      if (character !== '"') cell += character
      else if (text.charAt(i + 1) === '"') {
        cell += '"'
        i++
      } else quoted = false
    } else if (character === '"' && cell.trim() === '' && !wasQuoted) {
      quoted = true
      wasQuoted = true
      cell = ''
    } else if (character === delimiter || (delimiter === ' ' && character === '\t')) {
      if (delimiter !== ' ' || cell !== '') endCell()
    } else if (character === '\n' || character === '\r') {
      if (delimiter !== ' ' || cell !== '') endCell()
      if (line > behindLine && row.some((one) => one.trim() !== '')) rows.push(row)
      row = []
      if (character === '\n' || text.charAt(i + 1) !== '\n') line++
    } else cell += character
  }
  endCell()
  if (row.some((one) => one.trim() !== '')) rows.push(row)
  return rows
}

/** The number in a cell, digit by digit; NaN where it is none. Marks between thousands must stand before threes. */
export function slowNumber(cell: string, decimal: '.' | ','): number {
  const text = cell.trim()
  const match = /^([+\-\u2212]?)([^eE]*)(?:[eE]([+-]?\d+))?$/u.exec(text)
  if (!match) return NaN
  const [, sign = '', body = '', exponent] = match
  const [integer = '', fraction, ...more] = body.split(decimal)
  if (more.length > 0 || (fraction !== undefined && /\D/u.test(fraction))) return NaN
  const groups = integer.split(/[.,'’ \u00A0\u2009\u202F]/u)
  if (
    groups.length > 1 &&
    (!/^[1-9]?\d{1,2}$/u.test(groups[0] ?? '') || groups.slice(1).some((group) => !/^\d{3}$/u.test(group)))
  )
    return NaN
  const digits = groups.join('')
  if (/\D/u.test(digits) || digits + (fraction ?? '') === '') return NaN
  const value = Number(`${digits}.${fraction ?? ''}e${exponent ?? 0}`)
  return sign === '' || sign === '+' ? value : -value
}

function slowClock(cell: string): number {
  const parts = cell
    .trim()
    .replace(/^\d{4}-\d{1,2}-\d{1,2}[T ]/u, '')
    .replace(/Z$/u, '')
    .split(':')
  if (parts.length < 2 || parts.length > 3) return NaN
  return parts.reduce(
    (total, part) => total * 60 + (/^[\d.,]+$/u.test(part) ? Number(part.replace(',', '.')) : NaN),
    0,
  )
}

/** @returns null where some row under the headings is not whole: then the product must have said something */
export function readSlowly(bytes: Uint8Array, format: DelimitedFormat, map: ColumnMap): SlowReading | null {
  const text = new TextDecoder(format.encoding).decode(bytes)
  const rows = cellsOf(text, format.delimiter, format.headerLine ?? 0)
  const time = map.time
  const read = (row: string[], index: number): number => slowNumber(row[index] ?? '', format.decimalMark)
  const stamp = (row: string[]): number => {
    if (!time) return 0
    const value = read(row, time.index)
    return Number.isNaN(value) ? slowClock(row[time.index] ?? '') : value
  }
  const isWhole = (row: string[]): boolean =>
    Number.isFinite(stamp(row)) && map.forces.every(({ index }) => Number.isFinite(read(row, index)))
  const first = rows.findIndex(isWhole)
  const body = rows.slice(first)
  if (first < 0 || !body.every(isWhole)) return null
  const channels: SlowReading['channels'] = {}
  for (const force of map.forces) {
    const factor = (NEWTONS[force.unit] ?? NaN) * (force.downward ? -1 : 1)
    const before = channels[force.channel]
    channels[force.channel] = body.map((row, i) => (before?.[i] ?? 0) + read(row, force.index) * factor)
  }
  return { channels, stamps: time ? body.map(stamp) : null }
}
