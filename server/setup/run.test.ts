import { describe, expect, it } from 'vitest'
import { beganAt } from './process-table.mjs'
import { lastLines, run } from './run.mjs'

const node = (program: string, options = {}) => run(process.execPath, ['-e', program], options)

describe('a program that is run', () => {
  it('hands back its exit code and both streams', async () => {
    const { code, output } = await node('console.log("out"); console.error("err"); process.exitCode = 3')
    expect(code).toBe(3)
    expect(output.split('\n').sort()).toEqual(['', 'err', 'out'])
  })

  it('fails where there is no such program', async () => {
    const { code } = await run('no-such-program', [])
    expect(code).not.toBe(0)
  })

  it('is ended after its time, and counts as failed', async () => {
    const { code } = await node('setInterval(() => undefined, 1000)', { limitMs: 300 })
    expect(code).not.toBe(0)
  })

  it('takes along what it started', async () => {
    const starts = `
      const child = require('node:child_process').spawn('sleep', ['1000'], { stdio: 'ignore' })
      console.log(child.pid)
      process.exit(0)`
    const { output } = await node(starts)
    await expect.poll(() => beganAt(Number(output))).toBeUndefined()
  })
})

describe('the last lines of an output', () => {
  it('leave out what came before, and blank lines at the end', () => {
    expect(lastLines('1\n2\n3\n\n', 2)).toBe('2\n3')
  })
})
