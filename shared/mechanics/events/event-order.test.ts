import { describe, expect, it } from 'vitest'
import { findMisplaced } from './event-order.ts'

const standing = { onset: 1, minimumForce: 1.2, zeroVelocity: 1.5, takeoff: 1.8, touchdown: 2.3, still: 3.5 }

describe('findMisplaced(moved, standing, endS)', () => {
  it('finds nothing where every event keeps its place in the order', () => {
    expect(findMisplaced({}, standing, 4)).toBeNull()
    expect(findMisplaced({ takeoff: 1.9, onset: 0 }, standing, 4)).toBeNull()
    expect(findMisplaced({ still: 4 }, standing, 4)).toBeNull()
  })

  it('takes an event that the engine did not find', () => {
    expect(findMisplaced({ landingPeak: 2.4 }, standing, 4)).toBeNull()
    expect(findMisplaced({ landingPeak: 2.2 }, standing, 4)).toEqual({
      event: 'landingPeak',
      problem: 'not-after',
      other: 'touchdown',
      otherS: 2.3,
    })
  })

  it.each([
    [{ takeoff: -0.001 }, { event: 'takeoff', problem: 'outside', endS: 4 }],
    [{ still: 4.001 }, { event: 'still', problem: 'outside', endS: 4 }],
    [{ takeoff: NaN }, { event: 'takeoff', problem: 'outside', endS: 4 }],
    [{ takeoff: 1.5 }, { event: 'takeoff', problem: 'not-after', other: 'zeroVelocity', otherS: 1.5 }],
    [{ takeoff: 2.4 }, { event: 'takeoff', problem: 'not-before', other: 'touchdown', otherS: 2.3 }],
    [
      { takeoff: 2.5, touchdown: 2.4 },
      { event: 'touchdown', problem: 'not-after', other: 'takeoff', otherS: 2.5 },
    ],
  ])('%j', (moved, misplaced) => {
    expect(findMisplaced(moved, standing, 4)).toEqual(misplaced)
  })

  it('two moved past a third together may stand', () => {
    expect(findMisplaced({ takeoff: 2.4, touchdown: 2.6 }, standing, 4)).toBeNull()
  })

  it('says nothing of the engine’s own events', () => {
    expect(findMisplaced({ still: 3.6 }, { ...standing, takeoff: 2.3 }, 4)).toBeNull()
  })
})
