import { expect } from 'vitest'

export interface Tolerance {
  relative: number
  absolute: number
}

/** Fails unless each number is within the absolute tolerance, or the relative one, of its fellow. */
export function expectClose(found: ArrayLike<number>, wanted: ArrayLike<number>, tolerance: Tolerance): void {
  expect(found.length).toBe(wanted.length)
  for (let i = 0; i < found.length; i++) {
    const allowed = Math.max(tolerance.absolute, tolerance.relative * Math.abs(wanted[i]))
    if (!(Math.abs(found[i] - wanted[i]) <= allowed))
      expect.fail(`Number ${i} is ${found[i]}, not ${wanted[i]} within ${allowed}.`)
  }
}
