import { existsSync, readFileSync } from 'node:fs'
import { basename } from 'node:path'
import { describe, expect, it } from 'vitest'
import { projectFiles } from './files.ts'

const documents = ['README.md', 'DEVELOPERS.md']
const { scripts } = JSON.parse(readFileSync('package.json', 'utf8')) as { scripts: Record<string, string> }

/** Everything between backticks or in a link that a document names. */
const named = (text: string) =>
  [...text.matchAll(/`([^`\n]+)`|\]\(([^)\s#]+)/g)].map((m) => m[1] ?? m[2] ?? '')

const files = projectFiles()
const baseNames = new Set(files.map((file) => basename(file)))

/** Whether a document's word is meant as a path: one of the project's folders, or a file's name. Patterns are not. */
const isPath = (name: string) =>
  /^(src|server|shared|seed|tests|drizzle|public|\.ci)(\/[\w.-]+)*\/?$/.test(name) ||
  /^[\w-][\w.-]*\.(md|ts|tsx|mjs|json|js|html)$/.test(name)

/** A file named without its folder is looked for in all of them. */
const isThere = (name: string) => existsSync(name) || (!name.includes('/') && baseNames.has(name))

describe.each(documents)('%s', (document) => {
  const text = readFileSync(document, 'utf8')

  it('names only commands that exist', () => {
    const commands = [...text.matchAll(/npm (?:run )(?:--silent )?([\w:-]+)/g)].map((match) => match[1] ?? '')
    expect(commands.filter((command) => !(command in scripts))).toEqual([])
  })

  it('names only files and folders that exist', () => {
    expect(named(text).filter((name) => isPath(name) && !isThere(name))).toEqual([])
  })
})
