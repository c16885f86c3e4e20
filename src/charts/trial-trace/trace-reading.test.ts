import { describe, expect, it } from 'vitest'
import type { TraceData } from './trace-data.ts'
import { moveCursor, readTrace } from './trace-reading.ts'

const data: TraceData = {
  sampleRateHz: 1000,
  durationS: 2,
  total: Float64Array.from({ length: 2001 }, (_, i) => i),
  feet: [
    { key: 'left', label: 'left', values: Float64Array.from({ length: 2001 }, (_, i) => i * 0.6) },
    { key: 'right', label: 'right', values: Float64Array.from({ length: 2001 }, (_, i) => i * 0.4) },
  ],
  weight: { valueN: 800, label: 'body weight' },
  momentum: new Float64Array(2001).fill(-12.34),
  phases: [],
  overlays: [],
  events: [
    { key: 'takeoff', label: 'takeoff', timeS: 1.2 },
    { key: 'onset', label: 'onset', timeS: 0.5 },
  ],
}
const view = { startS: 0.1, endS: 1.9 }

describe('readTrace(data, time)', () => {
  it('reads both feet, each foot and the momentum, between samples', () => {
    expect(readTrace(data, 1.0004).values).toEqual([
      { label: 'both feet', text: '1\u202f000 N' },
      { label: 'left', text: '600 N' },
      { label: 'right', text: '400 N' },
      { label: 'momentum', text: '−12.3 kg·m/s' },
    ])
  })

  it('reads one force with one plate, and no momentum where there is none', () => {
    expect(readTrace({ ...data, feet: [], momentum: null }, 0.8).values).toEqual([
      { label: 'force', text: '800 N' },
    ])
  })
})

describe('moveCursor(key, shift, time, data, view)', () => {
  it('moves by ten milliseconds, with Shift by one sample', () => {
    expect(moveCursor('ArrowRight', false, 1, data, view)).toBeCloseTo(1.01, 9)
    expect(moveCursor('ArrowLeft', true, 1, data, view)).toBeCloseTo(0.999, 9)
  })

  it('goes from event to event with the Page keys, then to the end of the view', () => {
    expect(moveCursor('PageUp', false, 0.3, data, view)).toBe(0.5)
    expect(moveCursor('PageUp', false, 0.5, data, view)).toBe(1.2)
    expect(moveCursor('PageUp', false, 1.2, data, view)).toBe(1.9)
    expect(moveCursor('PageDown', false, 1.2, data, view)).toBe(0.5)
  })

  it('never leaves the view', () => {
    expect(moveCursor('ArrowLeft', false, 0.1, data, view)).toBe(0.1)
    expect(moveCursor('End', false, 0.1, data, view)).toBe(1.9)
  })

  it('leaves every other key alone', () => {
    expect(moveCursor('Tab', false, 1, data, view)).toBeNull()
  })
})
