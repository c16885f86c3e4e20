import { describe, expect, it } from 'vitest'
import { readSamples, SamplesDamaged } from './read-samples.ts'

function bytesOf(values: number[]): ArrayBuffer {
  const view = new DataView(new ArrayBuffer(values.length * 4))
  values.forEach((value, i) => view.setInt32(i * 4, value, true))
  return view.buffer
}

describe('readSamples(bytes, channels, sampleCount)', () => {
  it('gives each channel its samples in newtons, in the order of the channels', () => {
    const samples = readSamples(bytesOf([1000, -2500, 3, 4_000_000]), ['right', 'left'], 2)
    expect(samples).toEqual({ right: Float64Array.of(1, -2.5), left: Float64Array.of(0.003, 4000) })
  })

  it('refuses a recording with bytes missing or left over', () => {
    expect(() => readSamples(bytesOf([1, 2, 3]), ['single'], 4)).toThrow(SamplesDamaged)
    expect(() => readSamples(bytesOf([1, 2, 3]), ['single'], 2)).toThrow(SamplesDamaged)
  })

  it('gives empty channels for a recording without samples', () => {
    expect(readSamples(bytesOf([]), ['single'], 0)).toEqual({ single: new Float64Array(0) })
  })
})
