import { describe, expect, it } from 'vitest'
import { phaseShape } from './phase-shapes.ts'

/** One pixel a millisecond, one a newton, from the top. */
const scales = { time: (timeS: number) => timeS * 1000, force: (forceN: number) => 2000 - forceN }
const rate = 1000
const weightN = 800
const constant = (forceN: number) => new Float64Array(1001).fill(forceN)

describe('phaseShape(phase, force, rate, weight, scales)', () => {
  it('draws a push above the weight as an area above it and none below', () => {
    const shape = phaseShape(
      { phase: 'propulsion', startS: 0.1, endS: 0.3, netImpulse: 80 },
      constant(1200),
      rate,
      weightN,
      scales,
    )
    expect(shape.above.startsWith('M100,800')).toBe(true)
    expect(shape.above).toContain('1200')
    expect(new Set(yOf(shape.below))).toEqual(new Set([1200]))
  })

  it('begins and ends between samples where the event was fitted', () => {
    const shape = phaseShape(
      { phase: 'braking', startS: 0.1004, endS: 0.2996, netImpulse: 80 },
      constant(1200),
      rate,
      weightN,
      scales,
    )
    expect(xOf(shape.above)[0]).toBeCloseTo(100.4, 6)
    expect(Math.max(...xOf(shape.above))).toBeCloseTo(299.6, 6)
  })

  it('writes its figure in the middle of a symmetric area', () => {
    const shape = phaseShape(
      { phase: 'flight', startS: 0.2, endS: 0.6, netImpulse: -320 },
      constant(0),
      rate,
      weightN,
      scales,
    )
    expect(shape.label?.x).toBeCloseTo(400, 0)
    expect(shape.label?.room).toBeCloseTo(400, 6)
    expect(shape.label?.height).toBeCloseTo(800, 6)
  })

  it('writes no figure where the areas above and below cancel', () => {
    const force = Float64Array.from({ length: 1001 }, (_, i) => weightN + (i < 500 ? 200 : -200))
    const shape = phaseShape(
      { phase: 'settling', startS: 0, endS: 1, netImpulse: 0 },
      force,
      rate,
      weightN,
      scales,
    )
    expect(shape.label).toBeNull()
  })

  it('writes no figure where the force is the weight throughout', () => {
    const shape = phaseShape(
      { phase: 'settling', startS: 0, endS: 1, netImpulse: 0 },
      constant(weightN),
      rate,
      weightN,
      scales,
    )
    expect(shape.label).toBeNull()
  })
})

const pairs = (path: string) => path.match(/-?[\d.]+,-?[\d.]+/g)!.map((pair) => pair.split(',').map(Number))
const xOf = (path: string) => pairs(path).map(([x]) => x!)
const yOf = (path: string) => pairs(path).map(([, y]) => y!)
