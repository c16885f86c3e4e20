import { readFileSync } from 'node:fs'
import { basename } from 'node:path'
import { describe, expect, it } from 'vitest'
import { projectFiles } from './files.ts'

const ours = projectFiles().filter((file) => /^(src|server|shared|seed|tests|public)\//.test(file))
const code = ours.filter((file) => /\.(ts|tsx|mjs|css)$/.test(file))

/** kebab-case words, with dots between the parts of a role: trials.service.ts, 0001_name.sql aside. */
const kebab = /^[a-z0-9]+(-[a-z0-9]+)*(\.[a-z0-9]+(-[a-z0-9]+)*)+$/

const mostLines = 400
const sayNothing = /^(utils?|helpers?|misc|common|stuff|index)$/

describe('the files of the project', () => {
  it('are found', () => {
    expect(code.length).toBeGreaterThan(50)
  })

  it('have names in kebab-case', () => {
    // A test case's input may be named as clubs name theirs: that is what it tests. Samples show it, too.
    const named = ours.filter((file) => !/^(tests\/cases|public\/samples)\//.test(file))
    expect(named.filter((file) => !kebab.test(basename(file)))).toEqual([])
  })

  it('have names that say their role', () => {
    const drawers = code.filter((file) =>
      file.split('/').some((part) => sayNothing.test(part.replace(/\..*$/, ''))),
    )
    expect(drawers).toEqual([])
  })

  it(`have at most ${mostLines} lines`, () => {
    const long = code.filter((file) => readFileSync(file, 'utf8').trimEnd().split('\n').length > mostLines)
    expect(long).toEqual([])
  })
})
