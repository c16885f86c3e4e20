import { describe, expect, it } from 'vitest'
import { jumpView } from './trace-view.ts'

const phase = (startS: number, endS: number) => ({ phase: 'flight' as const, startS, endS, netImpulse: 0 })

describe('jumpView(phases, duration)', () => {
  it('shows the jump with half a second on either side', () => {
    expect(jumpView([phase(2, 2.5), phase(2.5, 4)], 8)).toEqual({ startS: 1.5, endS: 4.5 })
  })

  it('stays inside the recording', () => {
    expect(jumpView([phase(0.2, 0.9)], 1)).toEqual({ startS: 0, endS: 1 })
  })

  it('shows the whole recording where no jump was found', () => {
    expect(jumpView([], 8)).toEqual({ startS: 0, endS: 8 })
  })
})
