import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { dirname, join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { findForbiddenImports, importRules } from './import-rules.ts'

const folders = ['shared', 'server', 'src', 'seed', 'tests']

type Import = [from: string, to: string]

/** Violations of each rule: what has to be imported for it to be broken, one way or another. */
const planted: Record<string, Import[][]> = {
  purity: [
    [['shared/mechanics/a.ts', 'node:fs']],
    [['shared/units/b.ts', '../contracts/c.ts']],
    [['shared/statistics/d.ts', 'zod']],
  ],
  'direction-shared': [[['shared/contracts/a.ts', '../../server/b.ts']]],
  'direction-src': [[['src/pages/a.ts', '../../server/b.ts']]],
  'direction-server': [[['server/a.ts', '../src/b.ts']]],
  'direction-tests': [[['server/a.ts', '../seed/b.ts']], [['src/lib/a.ts', '../../tests/setup/b.ts']]],
  'direction-unit-tests': [[['shared/units/a.test.ts', '../../tests/api/b.ts']]],
  'direction-queries-of-others': [
    [['server/modules/trials/trials.service.ts', '../squads/squads.queries.ts']],
  ],
  'direction-queries-from-outside': [[['server/jobs/a.ts', '../modules/squads/squads.queries.ts']]],
  'no-cycles': [
    [
      ['src/lib/a.ts', './b.ts'],
      ['src/lib/b.ts', './a.ts'],
    ],
  ],
}

/** What comes close to breaking a rule, and is allowed. */
const allowed: Import[] = [
  ['shared/recordings/a.ts', '../units/b.ts'],
  ['shared/mechanics/a.test.ts', '../../seed/b.ts'],
  ['server/modules/trials/trials.service.ts', './trials.queries.ts'],
  ['server/modules/trials/trials.routes.ts', '../squads/squads.service.ts'],
  ['seed/demo/a.ts', '../../server/modules/squads/squads.service.ts'],
]

let fixture: string

beforeEach(() => {
  fixture = mkdtempSync(join(tmpdir(), 'import-rules-'))
  for (const folder of folders) mkdirSync(join(fixture, folder))
})
afterEach(() => rmSync(fixture, { recursive: true }))

function plant(imports: Import[]): void {
  for (const [from, to] of imports) {
    if (to.startsWith('.')) write(join(dirname(from), to), 'export const it = 1\n', { flag: 'a' })
  }
  for (const [from, to] of imports)
    write(from, `export type {} from '${to}'\nimport '${to}'\n`, { flag: 'a' })
}

function write(path: string, text: string, options: { flag: string }): void {
  const file = join(fixture, path)
  mkdirSync(dirname(file), { recursive: true })
  writeFileSync(file, text, options)
}

describe('the import rules', () => {
  it('hold in this project', { timeout: 60_000 }, async () => {
    expect(await findForbiddenImports(process.cwd(), folders)).toEqual([])
  })

  it('are each proved by a planted violation', () => {
    expect(Object.keys(planted).sort()).toEqual(importRules.map((rule) => rule.name).sort())
  })

  const violations = Object.entries(planted).flatMap(([name, ways]) => ways.map((way) => ({ name, way })))

  it.each(violations)('catch a violation of $name: $way', async ({ name, way }) => {
    plant(way)
    const found = await findForbiddenImports(fixture, folders)
    expect(found).toContainEqual(expect.stringContaining(`${name}: ${way[0]?.[0]}`))
  })

  it('let through what they allow', async () => {
    plant(allowed)
    expect(await findForbiddenImports(fixture, folders)).toEqual([])
  })
})
