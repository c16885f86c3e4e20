import { describe, expect, it } from 'vitest'
import type { Protocol } from '../mechanics/types.ts'
import { isSameTest, SessionTest, testFaults, usualTest } from './session-test.ts'

const protocols: Protocol[] = ['cmj', 'sj', 'dj', 'slcmj', 'dropLanding', 'hops']

describe('usualTest(protocol)', () => {
  it('lacks nothing but the box where there is one', () => {
    for (const protocol of protocols) {
      const needsBox = protocol === 'dj' || protocol === 'dropLanding'
      expect(Object.keys(testFaults(usualTest(protocol)))).toEqual(needsBox ? ['boxHeightM'] : [])
    }
  })
})

describe('testFaults(test)', () => {
  it('wants a box where the test begins on one, and none elsewhere', () => {
    expect(testFaults({ ...usualTest('dj'), boxHeightM: 0.3 })).toEqual({})
    expect(testFaults({ ...usualTest('cmj'), boxHeightM: 0.3 })).toEqual({
      boxHeightM: 'This test has no box',
    })
  })

  it('wants one leg of a single-leg jump, any side of a drop landing, and both feet elsewhere', () => {
    expect(testFaults({ ...usualTest('slcmj'), side: 'both' })).toHaveProperty('side')
    expect(testFaults({ ...usualTest('slcmj'), side: 'right' })).toEqual({})
    for (const side of ['both', 'left', 'right'] as const)
      expect(testFaults({ ...usualTest('dropLanding'), boxHeightM: 0.3, side })).toEqual({})
    expect(testFaults({ ...usualTest('hops'), side: 'left' })).toHaveProperty('side')
  })

  it('knows loads of jumps from stance only, and free arms of all but a drop landing', () => {
    for (const protocol of protocols) {
      const loaded = testFaults({ ...usualTest(protocol), externalLoadKg: 20 })
      expect('externalLoadKg' in loaded).toBe(!['cmj', 'sj', 'slcmj'].includes(protocol))
      expect('arms' in testFaults({ ...usualTest(protocol), arms: 'free' })).toBe(protocol === 'dropLanding')
    }
  })
})

describe('SessionTest', () => {
  it('puts a fault at its field', () => {
    const { error } = SessionTest.safeParse({ ...usualTest('cmj'), side: 'left' })
    expect(error?.issues.map(({ path, message }) => [path, message])).toEqual([
      [['side'], 'Choose a side that this test is done on'],
    ])
  })
})

describe('isSameTest(a, b)', () => {
  it('tells tests apart by any one part', () => {
    const test = usualTest('cmj')
    expect(isSameTest(test, { ...test })).toBe(true)
    for (const other of [
      { side: 'left' },
      { externalLoadKg: 1 },
      { boxHeightM: 0.3 },
      { arms: 'free' },
    ] as const)
      expect(isSameTest(test, { ...test, ...other })).toBe(false)
  })
})
