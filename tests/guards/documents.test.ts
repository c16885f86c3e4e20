import { existsSync, readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'

const documents = ['README.md', 'DEVELOPERS.md']
const { scripts } = JSON.parse(readFileSync('package.json', 'utf8')) as { scripts: Record<string, string> }

/** Everything between backticks or in a link that a document names. */
const named = (text: string) =>
  [...text.matchAll(/`([^`\n]+)`|\]\(([^)\s#]+)/g)].map((m) => m[1] ?? m[2] ?? '')

/** A path of the project: begins with one of its folders, or is a file at its root. Patterns are left out. */
const isPath = (name: string) =>
  /^(\.\/)?((src|server|shared|seed|tests|drizzle|public|\.ci)(\/[\w.-]+)*\/?|[\w.-]+\.(md|ts|json|js|html))$/.test(
    name,
  )

describe.each(documents)('%s', (document) => {
  const text = readFileSync(document, 'utf8')

  it('names only commands that exist', () => {
    const commands = [...text.matchAll(/npm (?:run )(?:--silent )?([\w:-]+)/g)].map((match) => match[1] ?? '')
    expect(commands.filter((command) => !(command in scripts))).toEqual([])
  })

  it('names only files and folders that exist', () => {
    expect(named(text).filter((name) => isPath(name) && !existsSync(name))).toEqual([])
  })
})
