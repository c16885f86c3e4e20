import { describe, expect, it } from 'vitest'
import { createSlots } from './slots.ts'

/** Work that ends when it is told to. */
function controlled() {
  const began: number[] = []
  const ends: ((error?: Error) => void)[] = []
  const work = (n: number) => () => {
    began.push(n)
    return new Promise<number>((resolve, reject) => {
      ends[n] = (error) => (error ? reject(error) : resolve(n))
    })
  }
  return { began, end: (n: number, error?: Error) => ends[n](error), work }
}
const settle = () => new Promise((resolve) => setImmediate(resolve))

describe('slots', () => {
  it('let so many pieces of work run at once, the others in order', async () => {
    const slots = createSlots(2)
    const { began, end, work } = controlled()
    const results = [0, 1, 2, 3].map((n) => slots(work(n)))
    await settle()
    expect(began).toEqual([0, 1])
    end(1)
    await settle()
    expect(began).toEqual([0, 1, 2])
    end(0)
    await settle()
    end(2)
    end(3)
    expect(await Promise.all(results)).toEqual([0, 1, 2, 3])
  })

  it('are free again after work that failed', async () => {
    const slots = createSlots(1)
    const { end, work } = controlled()
    const first = slots(work(0))
    const second = slots(work(1))
    await settle()
    end(0, new Error('failed'))
    await expect(first).rejects.toThrow('failed')
    await settle()
    end(1)
    expect(await second).toBe(1)
  })
})
