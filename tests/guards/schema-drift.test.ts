import { execFileSync } from 'node:child_process'
import { cpSync, mkdtempSync, readdirSync, rmSync, symlinkSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join, resolve } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'

let copy: string

beforeEach(() => {
  copy = mkdtempSync(join(tmpdir(), 'schema-drift-'))
  for (const path of ['drizzle', 'drizzle.config.ts', 'package.json', 'server/db/schema', 'shared']) {
    cpSync(path, join(copy, path), { recursive: true })
  }
  symlinkSync(resolve('node_modules'), join(copy, 'node_modules'))
})
afterEach(() => rmSync(copy, { recursive: true }))

const migrations = (folder: string) =>
  readdirSync(join(folder, 'drizzle')).filter((name) => name.endsWith('.sql'))

describe('the migrations', () => {
  it('make exactly the tables that server/db/schema describes', { timeout: 60_000 }, () => {
    const kit = resolve('node_modules/drizzle-kit/bin.cjs')
    const said = execFileSync(process.execPath, [kit, 'generate'], { cwd: copy, encoding: 'utf8' })
    expect(migrations(copy), said).toEqual(migrations('.'))
    expect(said).toContain('nothing to migrate')
  })
})
