import { describe, expect, it } from 'vitest'
import type { Recording } from '../mechanics/types.ts'
import { previewOf } from './preview.ts'

const recording = (channels: Recording['channels']): Recording => ({
  sampleRateHz: 1000,
  channels,
  filledSamples: 0,
  timeBaseError: 0,
  notes: [],
})

describe('previewOf', () => {
  it('keeps the peak, the flight and the ends of a long recording in 240 points', () => {
    const force = new Float64Array(8000).fill(800)
    force[4321] = 4000
    force.fill(0, 3000, 3400)
    const { timeS, forceN } = previewOf(recording({ single: force }))
    expect(timeS.length).toBeLessThanOrEqual(240)
    expect([Math.max(...forceN), Math.min(...forceN)]).toStrictEqual([4000, 0])
    expect(timeS[forceN.indexOf(4000)]).toBe(4.321)
    expect(timeS).toStrictEqual([...timeS].sort((a, b) => a - b))
  })

  it('runs smoothly through a push, without a zigzag between neighbouring points', () => {
    const push = Float64Array.from({ length: 4000 }, (_, i) => 800 + 1000 * Math.sin((Math.PI * i) / 4000))
    const { forceN } = previewOf(recording({ single: push }))
    const steps = forceN.slice(1).map((force, i) => force - forceN[i]!)
    const top = forceN.indexOf(Math.max(...forceN))
    expect(Math.min(...steps.slice(0, top))).toBeGreaterThanOrEqual(0)
    expect(Math.max(...steps.slice(top))).toBeLessThanOrEqual(0)
    expect(forceN.length).toBe(240)
  })

  it('adds the feet up', () => {
    const { forceN } = previewOf(
      recording({ left: Float64Array.of(1, 2, 3), right: Float64Array.of(10, 20, 30) }),
    )
    expect(forceN).toStrictEqual([11, 22, 33])
  })

  it('is empty for an empty recording', () => {
    expect(previewOf(recording({ single: new Float64Array(0) }))).toStrictEqual({ timeS: [], forceN: [] })
  })
})
