import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { packagesMatchLock } from './packages.mjs'

const wanted = {
  '': { name: 'underfoot' },
  'node_modules/a': { version: '1.0.0', integrity: 'sha512-a' },
  'node_modules/left-over': { version: '3.0.0', integrity: 'sha512-c', extraneous: true },
  'node_modules/only-elsewhere': { version: '2.0.0', integrity: 'sha512-b', optional: true },
}
let folder: string

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'packages-'))
  mkdirSync(join(folder, 'node_modules'))
  writeFileSync(join(folder, 'package-lock.json'), JSON.stringify({ packages: wanted }))
})
afterEach(() => rmSync(folder, { recursive: true }))

const install = (packages: object) =>
  writeFileSync(join(folder, 'node_modules/.package-lock.json'), JSON.stringify({ packages }))

describe('installed packages', () => {
  it('are stale where nothing was installed, or the installation was cut short', () => {
    expect(packagesMatchLock(folder)).toBe(false)
  })

  it('are current where each of the lock file is there, but for those of other platforms and those nothing asks for', () => {
    install({ 'node_modules/a': wanted['node_modules/a'] })
    expect(packagesMatchLock(folder)).toBe(true)
  })

  it.each([
    ['a newer version is locked', { version: '0.9.0', integrity: 'sha512-a' }],
    ['the locked contents are others', { version: '1.0.0', integrity: 'sha512-x' }],
  ])('are stale where %s', (_what, found) => {
    install({ 'node_modules/a': found })
    expect(packagesMatchLock(folder)).toBe(false)
  })

  it('are stale where one is missing', () => {
    install({})
    expect(packagesMatchLock(folder)).toBe(false)
  })

  it('cannot be judged without a lock file, and that is said', () => {
    writeFileSync(join(folder, 'package-lock.json'), '{')
    expect(() => packagesMatchLock(folder)).toThrow(/package-lock\.json is missing or damaged/)
  })
})
