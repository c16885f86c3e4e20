import { ESLint } from 'eslint'
import { describe, expect, it } from 'vitest'

const eslint = new ESLint()

/** The rules that a text breaks, were it a file at a path. */
async function broken(path: string, text: string): Promise<(string | null)[]> {
  const [result] = await eslint.lintText(text, { filePath: path })
  return (result?.messages ?? []).map((message) => message.ruleId)
}

describe('the purity of the science', () => {
  it.each([
    ['the clock', 'export const now = () => Date.now()'],
    ['a date', 'export const today = new Date()'],
    ['the network', "export const ask = () => fetch('/')"],
    ['the page', 'export const title = document.title'],
    ['Node.js', 'export const here = process.cwd()'],
    ['the terminal', "console.log('x')"],
    ['a timer', 'setTimeout(() => undefined, 1)'],
    ['the global object', 'export const all = globalThis'],
  ])('does without %s', async (_what, text) => {
    for (const folder of ['units', 'recordings', 'mechanics/signal', 'statistics']) {
      expect(await broken(`shared/${folder}/planted.ts`, text)).toContain('no-restricted-globals')
    }
  })

  it('does without chance', async () => {
    const text = 'export const chance = () => Math.random()'
    expect(await broken('shared/statistics/planted.ts', text)).toContain('no-restricted-properties')
  })

  it('lets a unit test read what it needs, and plain mathematics through', async () => {
    expect(await broken('shared/units/planted.test.ts', 'export const now = Date.now()')).toEqual([])
    expect(await broken('shared/units/planted.ts', 'export const root = Math.sqrt(2)')).toEqual([])
  })
})

describe('the environment', () => {
  it('is read by server/config and by nothing else of the product', async () => {
    const text = 'export const port = process.env.PORT'
    expect(await broken('server/planted.ts', text)).toContain('no-restricted-syntax')
    expect(await broken('server/config/planted.ts', text)).toEqual([])
  })
})
