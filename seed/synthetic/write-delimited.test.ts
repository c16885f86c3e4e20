import { describe, expect, it } from 'vitest'
import type { Recording } from '../../shared/mechanics/types.ts'
import { readRecording } from '../../shared/recordings/read-recording.ts'
import { fileStyle, fileStyles } from './file-styles.ts'
import { makeJump } from './jump.ts'
import { recordJump } from './record.ts'
import { writeDelimited } from './write-delimited.ts'

const text = (bytes: Uint8Array): string => new TextDecoder('utf-8', { ignoreBOM: true }).decode(bytes)
const tiny: Recording = {
  sampleRateHz: 250,
  channels: { left: Float64Array.of(0, -1.005, 1234.5), right: Float64Array.of(0.004, 99.996, -0.2) },
  filledSamples: 0,
  timeBaseError: 0,
  notes: [],
}

describe('writeDelimited', () => {
  it('writes headings, fixed decimals and signs', () => {
    expect(text(writeDelimited(tiny))).toBe(
      'Time (s),Left (N),Right (N)\n0.000,0.00,0.00\n0.004,-1.00,100.00\n0.008,1234.50,-0.20\n',
    )
  })

  it('writes the style asked for: mark, line ends, quotes, counter, total, lines above', () => {
    const style = fileStyle({
      delimiter: ';',
      lineBreak: '\r\n',
      byteOrderMark: true,
      quoteHeadings: true,
      timeUnit: 'ms',
      timeDecimals: 0,
      counter: 'No',
      total: 'Sum (N)',
      preamble: ['Invented'],
    })
    expect(text(writeDelimited(tiny, style)).split('\r\n').slice(0, 4)).toStrictEqual([
      '\uFEFFInvented',
      '"No";"Time (s)";"Left (N)";"Right (N)";"Sum (N)"',
      '1;0;0.00;0.00;0.00',
      '2;4;-1.00;100.00;98.99',
    ])
  })

  it('writes numbers as the language does', () => {
    const values = Float64Array.from({ length: 3000 }, (_, i) => Math.fround((i - 1500) * 1.37))
    const lines = text(
      writeDelimited({ ...tiny, channels: { single: values } }, fileStyle({ forceDecimals: 1 })),
    ).split('\n')
    for (const i of [0, 1, 1499, 1500, 1501, 2999]) {
      expect(Number(lines[i + 1]?.split(',')[1])).toBeCloseTo(values[i] ?? NaN, 1)
    }
  })

  it.each(Object.entries(fileStyles))('is read back to its last decimal in the style %s', (name, style) => {
    const recording = recordJump(makeJump(), {}, { left: { whiteNoiseN: 1 }, right: { whiteNoiseN: 1 } })
    const result = readRecording(writeDelimited(recording, style), `${name}.csv`)
    if (!result.ok) throw new Error(result.error.sentence)
    const half = (style.forceUnit === 'kN' ? 1000 : 1) * 0.5 * 10 ** -style.forceDecimals + 0.0005
    expect(result.recording.sampleRateHz).toBe(1000)
    for (const foot of ['left', 'right'] as const) {
      const read = result.recording.channels[foot] ?? new Float64Array(0)
      const greatest = read.reduce(
        (most, force, i) => Math.max(most, Math.abs(force - (recording.channels[foot]?.[i] ?? NaN))),
        0,
      )
      expect(greatest).toBeLessThan(half + 1e-9)
    }
  })
})
