import { spawn } from 'node:child_process'
import { once } from 'node:events'
import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it, onTestFinished } from 'vitest'
import { holdLock } from './lock.mjs'

let folder: string

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'lock-'))
})
afterEach(() => rmSync(folder, { recursive: true }))

const holder = async (purpose: string) => (await hold(purpose)).holder

/** Takes the lock for the length of a test. */
async function hold(purpose: string) {
  const lock = await holdLock(folder, purpose)
  onTestFinished(lock.release)
  return lock
}

describe('the lock of a folder', () => {
  it('tells the second who holds it, and keeps two purposes apart', async () => {
    expect(await holder('start')).toBeUndefined()
    expect(await holder('start')).toBe(String(process.pid))
    expect(await holder('test')).toBeUndefined()
  })

  it('is free again when it is let go', async () => {
    const { release } = await hold('start')
    release()
    expect(await holder('start')).toBeUndefined()
  })

  it('is free again the moment its holder is killed', async () => {
    const program = `
      import { holdLock } from '${new URL('lock.mjs', import.meta.url).href}'
      await holdLock(${JSON.stringify(folder)}, 'start')
      console.log('held')
      process.stdin.on('end', () => process.exit()).resume() // ends with the test, even a killed one`
    const other = spawn(process.execPath, ['--input-type=module', '-e', program])
    onTestFinished(() => void other.kill('SIGKILL'))
    await once(other.stdout, 'data')
    expect(await holder('start')).toBe(String(other.pid))
    other.kill('SIGKILL')
    await once(other, 'exit')
    expect(await holder('start')).toBeUndefined()
  })
})
