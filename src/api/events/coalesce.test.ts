import { describe, expect, it, vi } from 'vitest'
import { coalesce } from './coalesce.ts'

const rest = () => Promise.resolve()

describe('coalesce(run, rest)', () => {
  it('runs once more for any number of calls while it is at work', async () => {
    const ends: (() => void)[] = []
    const run = vi.fn(() => new Promise<void>((resolve) => ends.push(resolve)))
    const trigger = coalesce(run, rest)
    const done = trigger()
    void trigger()
    void trigger()
    expect(run).toHaveBeenCalledTimes(1)
    ends[0]!()
    await vi.waitFor(() => expect(run).toHaveBeenCalledTimes(2))
    ends[1]!()
    await done
    expect(run).toHaveBeenCalledTimes(2)
  })

  it('holds a call back until it has rested', async () => {
    const run = vi.fn(() => Promise.resolve())
    const rested: (() => void)[] = []
    const trigger = coalesce(run, () => new Promise<void>((resolve) => rested.push(resolve)))
    void trigger()
    await vi.waitFor(() => expect(rested).toHaveLength(1))
    void trigger()
    expect(run).toHaveBeenCalledTimes(1)
    rested[0]!()
    await vi.waitFor(() => expect(run).toHaveBeenCalledTimes(2))
    rested[1]?.()
  })

  it('runs again for a call after it is done, and after a failure', async () => {
    const run = vi.fn(() => Promise.resolve())
    run.mockRejectedValueOnce(new Error('no answer'))
    const trigger = coalesce(run, rest)
    await expect(trigger()).rejects.toThrow('no answer')
    await trigger()
    expect(run).toHaveBeenCalledTimes(2)
  })
})
