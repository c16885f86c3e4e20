import type { ForceChannel } from '../../../shared/mechanics/types.ts'
import { makeJump } from '../../../seed/synthetic/jump.ts'
import { recordJump } from '../../../seed/synthetic/record.ts'
import type { Case } from '../case.ts'

/** A case that is made: its folder's name behind the number, its file and what is expected of it. */
export interface MadeCase {
  name: string
  extension?: string
  bytes: Uint8Array
  expected: Case
}

export type Channels = Partial<Record<ForceChannel, number[]>>

/** Forces to 0.01 N: what the files hold. */
const cents = (newtons: number): number => Math.round(newtons * 100) / 100 + 0
export const thousandths = (newtons: number): number => Math.round(newtons * 1000) / 1000 + 0

/** Two straight lines that are no movement: for files in which only the writing matters. */
export const rising = (rows: number): number[] => Array.from({ length: rows }, (_, i) => 400 + 1.25 * i)
export const falling = (rows: number): number[] => Array.from({ length: rows }, (_, i) => 410.5 - 0.75 * i)

const recorded = recordJump(makeJump({ stanceS: 0.5 }), { durationS: 1.9, sampleRateHz: 100 })
const both = Array.from(
  recorded.channels.left ?? [],
  (newtons, i) => newtons + (recorded.channels.right?.[i] ?? 0),
)
/** A jump of the synthetic athlete at 100 Hz, a little more on the left, for files in which the weight tells. */
export const jump = {
  rateHz: 100,
  left: both.map((newtons) => cents(0.53 * newtons)),
  right: both.map((newtons) => cents(0.47 * newtons)),
}
export const bothFeet = jump.left.map((newtons, i) => cents(newtons + (jump.right[i] ?? 0)))

export const seconds = (rows: number, rateHz = 1000): string[] =>
  Array.from({ length: rows }, (_, i) => (i / rateHz).toFixed(3))

export const fixed = (values: number[], decimals = 2): string[] =>
  values.map((value) => value.toFixed(decimals))

export interface Layout {
  delimiter?: string
  lineBreak?: string
  preamble?: string[]
  /** Rows of headings; none: the file begins with numbers. */
  head?: string[][]
  /** Columns of cells. */
  columns: string[][]
  /** Text behind the last row; a line break where it is not given. */
  end?: string
}

/** The text of a table. */
export function text({
  delimiter = ',',
  lineBreak = '\n',
  preamble = [],
  head = [],
  columns,
  end,
}: Layout): string {
  const rows = (columns[0] ?? []).map((_, row) => columns.map((column) => column[row] ?? '').join(delimiter))
  const lines = [...preamble, ...head.map((cells) => cells.join(delimiter)), ...rows]
  return lines.join(lineBreak) + (end ?? lineBreak)
}

export const utf8 = (content: string): Uint8Array => new TextEncoder().encode(content)
export const table = (layout: Layout): Uint8Array => utf8(text(layout))

/** Two plates over `rows` rows at 1000 Hz, as most files here hold them. */
export function twoPlates(rows: number): { columns: string[][]; channels: Channels } {
  const [left, right] = [rising(rows), falling(rows)]
  return { columns: [seconds(rows), fixed(left), fixed(right)], channels: { left, right } }
}

export const plainHead = ['Time (s)', 'Left (N)', 'Right (N)']

type Extra = Omit<NonNullable<Case['reading']>, 'sampleRateHz' | 'filledSamples' | 'channels' | 'notes'> & {
  filledSamples?: number
}

/** What a file is expected to give. */
export function gives(
  channels: Channels,
  sampleRateHz: number,
  notes: string[] = [],
  extra: Extra = {},
): Case {
  const { filledSamples = 0, ...rest } = extra
  return { reading: { sampleRateHz, filledSamples, channels, notes, ...rest } }
}
