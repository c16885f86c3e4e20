import { describe, expect, it } from 'vitest'
import { defaultSettings } from '../settings.ts'
import type { ForceChannel, Recording } from '../types.ts'
import { conditionRecording, usualLevel, type Signal } from './condition.ts'

function recordingOf(channels: Partial<Record<ForceChannel, Float64Array>>, sampleRateHz = 1000): Recording {
  return { sampleRateHz, channels, filledSamples: 0, timeBaseError: 0, notes: [] }
}

function signalOf(channels: Partial<Record<ForceChannel, Float64Array>>): Signal {
  const conditioned = conditionRecording(recordingOf(channels), defaultSettings)
  if ('problem' in conditioned) throw new Error(conditioned.problem.code)
  return conditioned.signal
}

/** Standing, an empty spell, standing again with a push over twice the weight. */
const jumpLike = Float64Array.from({ length: 1000 }, (_, i) =>
  i > 500 && i < 700 ? 0 : i > 400 && i <= 500 ? 900 : 400,
)

describe('conditionRecording', () => {
  it('adds up two plates and leaves the recording as it was', () => {
    const left = jumpLike.slice()
    left[3] = NaN
    const right = jumpLike.map((newton) => -newton)
    const signal = signalOf({ left, right })
    expect(signal.total[0]).toBe(800)
    expect(signal.total[3]).toBe(800)
    expect(left[3]).toBeNaN()
    expect(right[0]).toBe(-400)
  })

  it('counts the longest of several stays at the ceiling', () => {
    const clipped = jumpLike.slice()
    clipped[100] = 900
    clipped[450] = 899
    expect(signalOf({ single: clipped }).plates[0].flatTop).toBe(50)
  })

  it('bridges unreadable samples by straight lines and counts them', () => {
    const gappy = jumpLike.slice()
    gappy.set([NaN, Infinity, 1e9], 10)
    gappy[0] = NaN
    gappy[999] = -Infinity
    const signal = signalOf({ single: gappy })
    expect(signal.unreadable).toBe(5)
    expect(signal.total).toEqual(jumpLike)
  })

  it('takes a record without one readable sample for zeros, all of them unreadable', () => {
    const signal = signalOf({ single: new Float64Array(50).fill(NaN) })
    expect(signal.unreadable).toBe(50)
    expect(signal.total.every((newton) => newton === 0)).toBe(true)
  })

  it('turns over a plate on which pressing reads negative, and only that one', () => {
    const signal = signalOf({ left: jumpLike.map((newton) => -newton), right: jumpLike })
    expect(signal.plates.map(({ flipped }) => flipped)).toEqual([true, false])
    expect(signal.total[450]).toBe(1800)
  })

  it('does not turn over a plate that was tared with the athlete on it', () => {
    expect(signalOf({ single: jumpLike.map((newton) => newton - 400) }).plates[0].flipped).toBe(false)
  })

  it('tells a dead plate, and how long force stays at its ceiling', () => {
    const signal = signalOf({ left: jumpLike, right: new Float64Array(1000).fill(2) })
    expect(signal.plates.map(({ dead }) => dead)).toEqual([false, true])
    expect(signal.plates[0].flatTop).toBe(100)
  })

  it.each([
    ['rate-unknown', recordingOf({ single: jumpLike }, 0)],
    ['rate-unknown', recordingOf({ single: jumpLike }, NaN)],
    ['no-force-column', recordingOf({})],
    ['unequal-channels', recordingOf({ left: jumpLike, right: jumpLike.slice(1) })],
    ['too-short', recordingOf({ single: new Float64Array(5) })],
    ['too-short', recordingOf({ total: new Float64Array(0) })],
  ])('says %s of what is no signal', (code, recording) => {
    const conditioned = conditionRecording(recording, defaultSettings)
    expect('problem' in conditioned && conditioned.problem.code).toBe(code)
  })
})

describe('usualLevel', () => {
  it('is a median: of one, of few, of many, whatever the order', () => {
    expect(usualLevel(Float64Array.of(3))).toBe(3)
    expect(usualLevel(Float64Array.of(9, 1, 5))).toBe(5)
    expect(usualLevel(jumpLike)).toBe(400)
    expect(usualLevel(jumpLike.slice().reverse())).toBe(400)
    expect(usualLevel(jumpLike.map((newton) => newton * 1e6 + 5))).toBe(4e8 + 5)
  })
})
