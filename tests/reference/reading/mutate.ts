import type { Random } from '../../../seed/synthetic/random.ts'

const LINE_FEED = 0x0a
/** Bytes that mean something to a reader: delimiters, quotes, signs, line ends, letters of exponents, NUL. */
const MARKS = [0x22, 0x2c, 0x3b, 0x09, 0x20, 0x7c, 0x0a, 0x0d, 0x2b, 0x2d, 0x2e, 0x45, 0x65, 0x00, 0x30, 0x39]

const join = (...pieces: Uint8Array[]): Uint8Array => new Uint8Array(Buffer.concat(pieces))
const whole = (random: Random, below: number): number => Math.floor(random.next() * below)

function lineAt(bytes: Uint8Array, at: number): { from: number; to: number } {
  const from = bytes.lastIndexOf(LINE_FEED, at - 1) + 1
  const end = bytes.indexOf(LINE_FEED, at)
  return { from, to: end < 0 ? bytes.length : end + 1 }
}

/** One change to a file: cut, flipped, repeated, or in another encoding from somewhere on. */
const changes: ((bytes: Uint8Array, at: number, length: number, random: Random) => Uint8Array)[] = [
  (bytes, at, _, random) => bytes.with(at, whole(random, 256)),
  (bytes, at, _, random) => bytes.with(at, (bytes[at] ?? 0) ^ (1 << whole(random, 8))),
  (bytes, at, _, random) => bytes.with(at, random.pick(MARKS)),
  (bytes, at, _, random) =>
    join(bytes.subarray(0, at), Uint8Array.of(random.pick(MARKS)), bytes.subarray(at)),
  (bytes, at, length) => join(bytes.subarray(0, at), bytes.subarray(at + length)),
  (bytes, at, length) => join(bytes.subarray(0, at + length), bytes.subarray(at)),
  (bytes, at) => bytes.slice(0, at),
  (bytes, at) => bytes.slice(at),
  (bytes, at) => join(bytes, bytes.subarray(at)),
  (bytes, at) => {
    const { from, to } = lineAt(bytes, at)
    return join(bytes.subarray(0, from), bytes.subarray(to))
  },
  (bytes, at) => {
    const { from, to } = lineAt(bytes, at)
    return join(bytes.subarray(0, to), bytes.subarray(from))
  },
  (bytes, at, _, random) => {
    const [one, two] = [lineAt(bytes, at), lineAt(bytes, whole(random, bytes.length))]
    const [first, second] = one.from <= two.from ? [one, two] : [two, one]
    if (second.from < first.to) return bytes
    const middle = bytes.subarray(first.to, second.from)
    const [a, b] = [bytes.subarray(first.from, first.to), bytes.subarray(second.from, second.to)]
    return join(bytes.subarray(0, first.from), b, middle, a, bytes.subarray(second.to))
  },
  (bytes, at) =>
    join(
      bytes.subarray(0, at),
      new Uint8Array(Buffer.from(Buffer.from(bytes.subarray(at)).toString('latin1'), 'utf16le')),
    ),
  (bytes, at, length) => {
    const middle = Buffer.from(
      Buffer.from(bytes.subarray(at, at + length)).toString('latin1'),
      'utf16le',
    ).swap16()
    return join(bytes.subarray(0, at), new Uint8Array(middle), bytes.subarray(at + length))
  },
  (bytes, at) => join(bytes.subarray(0, at), Uint8Array.of(0xe4, 0xf6, 0xa0), bytes.subarray(at)),
  (bytes, at) => join(bytes.subarray(0, at), Uint8Array.of(0xef, 0xbb, 0xbf), bytes.subarray(at)),
  (bytes) => bytes.map((byte) => (byte === LINE_FEED ? 0x0d : byte)),
  (bytes) => bytes.map((byte) => (byte === 0x2e ? 0x2c : byte)),
]

/** A copy of a file with one to three changes. */
export function mutated(file: Uint8Array, random: Random): Uint8Array {
  let bytes = file
  const count = 1 + whole(random, 3)
  for (let i = 0; i < count && bytes.length > 0; i++) {
    bytes = random.pick(changes)(bytes, whole(random, bytes.length), 1 + whole(random, 80), random)
  }
  return bytes
}
