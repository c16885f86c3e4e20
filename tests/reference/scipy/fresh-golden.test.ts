import { execFile } from 'node:child_process'
import { promisify } from 'node:util'
import { describe, expect, it } from 'vitest'
import golden from './golden.json' with { type: 'json' }

const run = promisify(execFile)
/** Debian's own Python: its SciPy is the one that .ci/run installs. */
const python = '/usr/bin/python3'
const script = 'tests/reference/scipy/make-golden.py'

async function scipyVersion(): Promise<string | null> {
  try {
    const { stdout } = await run(python, ['-I', '-c', 'import scipy; print(scipy.__version__)'])
    return stdout.trim()
  } catch {
    return null
  }
}

/** Paths of the numbers that differ by more than two versions of SciPy may, and of all else that differs at all. */
function differences(here: unknown, there: unknown, path = 'golden'): string[] {
  if (typeof here === 'number' && typeof there === 'number')
    return Math.abs(here - there) <= 1e-9 * Math.max(1, Math.abs(here))
      ? []
      : [`${path}: ${here} and ${there}`]
  if (typeof here !== 'object' || typeof there !== 'object' || here === null || there === null)
    return here === there ? [] : [`${path}: ${String(here)} and ${String(there)}`]
  const left = new Map(Object.entries(here))
  const right = new Map(Object.entries(there))
  return [...new Set([...left.keys(), ...right.keys()])].flatMap((key) =>
    differences(left.get(key), right.get(key), `${path}.${key}`),
  )
}

describe('the golden values', () => {
  it('come out the same when they are made anew', { timeout: 60_000 }, async ({ skip }) => {
    const version = await scipyVersion()
    skip(
      version === null,
      `${python} has no SciPy here: install Debian’s python3-scipy to make the values anew.`,
    )
    const { stdout } = await run(python, ['-I', '-B', script], { maxBuffer: 8 * 1024 * 1024 })
    const fresh = JSON.parse(stdout) as typeof golden
    expect(fresh.madeWith.scipy).toBe(version)
    expect(differences({ ...golden, madeWith: null }, { ...fresh, madeWith: null })).toEqual([])
  })

  it('would not come out the same if a number moved', () => {
    const moved = structuredClone(golden)
    moved.butterworth[0].onePass.a[1] += 1e-6
    moved.regressions.pop()
    expect(differences(golden, moved).length).toBe(2)
  })
})
