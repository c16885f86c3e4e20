import fc from 'fast-check'
import { deflateRawSync } from 'node:zlib'
import { describe, expect, it } from 'vitest'
import { makeJump } from '../../seed/synthetic/jump.ts'
import { recordJump } from '../../seed/synthetic/record.ts'
import type { Recording } from '../mechanics/types.ts'
import { toMillinewtonPrecision } from './force-precision.ts'
import { MAX_FORCE_N } from './limits.ts'
import { decodeSamples, encodeSamples } from './samples-codec.ts'

const recording = (channels: Recording['channels']): Recording => ({
  sampleRateHz: 1200.5,
  channels,
  filledSamples: 3,
  timeBaseError: 0.125,
  notes: [],
})

describe('the stored form of samples', () => {
  it('gives back every bit of any force that reading can leave', () => {
    const force = fc.double({ noNaN: true, min: -MAX_FORCE_N, max: MAX_FORCE_N }).map(toMillinewtonPrecision)
    const samples = fc.array(force, { minLength: 0, maxLength: 50 })
    fc.assert(
      fc.property(samples, (values) => {
        const before = recording({
          left: Float64Array.from(values),
          right: Float64Array.from(values).reverse(),
        })
        expect(decodeSamples(encodeSamples(before))).toStrictEqual(before)
      }),
      { seed: 7, numRuns: 300 },
    )
  })

  it('survives the greatest swing there is', () => {
    const before = recording({ single: Float64Array.of(MAX_FORCE_N, -MAX_FORCE_N, MAX_FORCE_N, 0.001, 0) })
    expect(decodeSamples(encodeSamples(before))).toStrictEqual(before)
  })

  it('presses an eight-second trial of two plates under 40 kB', () => {
    const plate = { whiteNoiseN: 1 }
    const jump = recordJump(makeJump(), { durationS: 8 }, { left: plate, right: plate })
    const packed = deflateRawSync(encodeSamples(jump), { level: 6 })
    expect(packed.length).toBeLessThan(40_000)
  })

  it('reads from the middle of a larger buffer and keeps the notes apart', () => {
    const bytes = encodeSamples(recording({ total: Float64Array.of(1.5, 2.25) }))
    const larger = new Uint8Array(bytes.length + 9)
    larger.set(bytes, 5)
    const notes = [{ code: 'feet-unknown', sentence: 'The feet are not known.' }]
    const read = decodeSamples(larger.subarray(5, 5 + bytes.length), notes)
    expect(read.channels.total).toStrictEqual(Float64Array.of(1.5, 2.25))
    expect(read.notes).toBe(notes)
  })

  it('refuses bytes that are cut or foreign', () => {
    const bytes = encodeSamples(recording({ single: Float64Array.of(1, 2, 3) }))
    expect(() => decodeSamples(bytes.subarray(0, bytes.length - 1))).toThrow('cut')
    expect(() => decodeSamples(new TextEncoder().encode('Time (s),Left (N),Right (N),Total (N)'))).toThrow(
      'no stored samples',
    )
  })
})
