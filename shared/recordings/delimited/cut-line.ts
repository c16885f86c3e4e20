import type { PlainStyle } from './scan-numbers.ts'

const [LF, CR] = [0x0a, 0x0d]
/** Whole lines before the last that it is held against. */
const COMPARED = 6
/** A longer last line is no row of a table. */
const LONGEST_LINE = 4096

function isLineEnd(byte: number | undefined): boolean {
  return byte === LF || byte === CR
}

/** The last lines of a text, the last one first, as far as they lie behind `start`. */
function lastLines(bytes: Uint8Array, start: number): string[] {
  const lines: string[] = []
  let end = bytes.length
  while (end > start && lines.length <= COMPARED) {
    let from = end
    while (from > start && !isLineEnd(bytes[from - 1])) {
      if (end - --from > LONGEST_LINE) return []
    }
    if (end > from) lines.push(String.fromCharCode(...bytes.subarray(from, end)))
    end = from
    while (end > start && isLineEnd(bytes[end - 1])) end--
  }
  return lines
}

/** Figures behind the decimal mark, or null for a cell that is no plain number. */
function decimalsOf(cell: string | undefined, decimal: string): number | null {
  const text = cell?.trim() ?? ''
  const at = text.indexOf(decimal)
  if (!/^[+-]?[\d.,]*\d[.,]?$/u.test(text)) return null
  return at < 0 ? 0 : text.length - at - 1
}

/**
 * Where the whole lines of a body end. A last line without a line end was cut short when it has fewer cells than all
 * the lines before it, or when its last number has fewer decimals than all of theirs.
 */
export function wholeLinesEnd(bytes: Uint8Array, start: number, { delimiter, decimal }: PlainStyle): number {
  const whole = bytes.length
  if (whole <= start || isLineEnd(bytes[whole - 1])) return whole
  const [last, ...before] = lastLines(bytes, start)
  if (last === undefined || before.length < 2 || last.includes('"')) return whole
  const split = (line: string): string[] =>
    delimiter === ' ' ? line.trim().split(/[ \t]+/u) : line.split(delimiter)
  const cells = split(last)
  if (!/^\s*[+\-\d.,:]/u.test(last)) return whole
  const others = before.map(split)
  if (others.some((other) => other.length !== others[0]?.length)) return whole
  const count = others[0]?.length ?? 0
  if (cells.length > count) return whole
  const column = cells.length - 1
  const decimals = others.map((other) => decimalsOf(other[column], decimal))
  const usual = decimals[0] ?? 0
  const isFixed = decimals.every((figures) => figures === usual)
  const own = decimalsOf(cells[column], decimal)
  const isCut = cells.length < count || (isFixed && usual > 0 && (own ?? 0) < usual)
  return isCut ? whole - last.length : whole
}
