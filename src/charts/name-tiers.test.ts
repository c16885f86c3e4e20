import { describe, expect, it } from 'vitest'
import { nameTiers } from './name-tiers.ts'

describe('nameTiers(names, gap)', () => {
  it('keeps names that do not touch on one tier', () => {
    expect(
      nameTiers(
        [
          { x: 10, width: 10 },
          { x: 40, width: 10 },
        ],
        4,
      ),
    ).toEqual([0, 0])
  })

  it('lifts a name that would touch the one before it, and comes down again when there is room', () => {
    expect(
      nameTiers(
        [
          { x: 10, width: 20 },
          { x: 20, width: 20 },
          { x: 45, width: 20 },
        ],
        4,
      ),
    ).toEqual([0, 1, 0])
  })

  it('answers in the order given, whatever the order of places', () => {
    expect(
      nameTiers(
        [
          { x: 20, width: 20 },
          { x: 10, width: 20 },
        ],
        4,
      ),
    ).toEqual([1, 0])
  })
})
