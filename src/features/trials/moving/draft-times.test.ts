import { describe, expect, test } from 'vitest'
import { boundsOf, changedEvents, placeWithin, stepFrom, timesOf, withoutEvent } from './draft-times.ts'

const clock = { sampleRateHz: 1000, endS: 4 }
const times = { onset: 1.0004, takeoff: 1.8, touchdown: 2.3 }

describe('where an event can be put', () => {
  test('whole samples, at least one away from its neighbours', () => {
    expect(boundsOf('takeoff', times, clock)).toEqual({ from: 1.001, to: 2.299 })
    expect(boundsOf('onset', times, clock)).toEqual({ from: 0, to: 1.799 })
    expect(boundsOf('still', times, clock)).toEqual({ from: 2.301, to: 4 })
  })

  test('the nearest sample, held at the bounds', () => {
    expect(placeWithin('takeoff', 1.81234, times, clock)).toBe(1.812)
    expect(placeWithin('takeoff', 9, times, clock)).toBe(2.299)
  })

  test('nowhere, where its neighbours leave no sample', () => {
    expect(placeWithin('takeoff', 1.8, { zeroVelocity: 1.8, touchdown: 1.8005 }, clock)).toBeNull()
  })
})

describe('a step', () => {
  test('goes to the next whole sample from between two, and then by whole ones', () => {
    expect(stepFrom(1.80042, 1, clock)).toBe(1.801)
    expect(stepFrom(1.80042, -1, clock)).toBe(1.8)
    expect(stepFrom(1.8, 1, clock)).toBe(1.801)
    expect(stepFrom(1.8, -10, clock)).toBe(1.79)
  })
})

describe('the draft', () => {
  test('stands over what the engine finds', () => {
    const events = { onset: { timeS: 1, sample: 1000 }, takeoff: { timeS: 1.8, sample: 1800 } }
    expect(timesOf({ events }, { takeoff: 1.7, still: 3 })).toEqual({ onset: 1, takeoff: 1.7, still: 3 })
  })

  test('lets an event go back to automatic and says what differs', () => {
    expect(withoutEvent({ onset: 1, takeoff: 2 }, 'onset')).toEqual({ takeoff: 2 })
    expect(changedEvents({ onset: 1, takeoff: 2 }, { takeoff: 2.1 })).toEqual(['onset', 'takeoff'])
    expect(changedEvents({ onset: 1 }, { onset: 1 })).toEqual([])
  })
})
