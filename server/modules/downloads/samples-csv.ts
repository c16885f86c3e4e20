import type { Trial } from '../../../shared/contracts/trials.ts'
import { csvLine } from './csv.ts'

const HEADINGS = { left: 'Left (N)', right: 'Right (N)', single: 'Force (N)', total: 'Total (N)' }

/** Lines in one piece of the stream: some 100 kB. */
const LINES_A_PIECE = 4096

/** Whole millinewtons as newtons, without the arithmetic of binary fractions. */
function newtons(millinewtons: number): string {
  const [sign, size] = millinewtons < 0 ? ['-', -millinewtons] : ['', millinewtons]
  return `${sign}${Math.floor(size / 1000)}.${String(size % 1000).padStart(3, '0')}`
}

/**
 * The samples as CSV under headings with units, in pieces.
 * @param samples little-endian int32 millinewtons, channel after channel in the order of `recording.channels`
 */
export function* samplesCsv(
  { sampleRateHz, sampleCount, channels }: Trial['recording'],
  samples: Buffer,
): Generator<string> {
  yield csvLine(['Time (s)', ...channels.map((channel) => HEADINGS[channel])])
  for (let start = 0; start < sampleCount; start += LINES_A_PIECE) {
    let piece = ''
    for (let i = start; i < Math.min(sampleCount, start + LINES_A_PIECE); i++) {
      // To a nanosecond: the rate comes back from it whatever it is.
      piece += Number((i / sampleRateHz).toFixed(9))
      for (let k = 0; k < channels.length; k++)
        piece += `,${newtons(samples.readInt32LE(4 * (k * sampleCount + i)))}`
      piece += '\r\n'
    }
    yield piece
  }
}
