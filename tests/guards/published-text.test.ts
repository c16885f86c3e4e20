import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { projectFiles } from './files.ts'

const texts = projectFiles().filter((file) =>
  /\.(ts|tsx|mjs|js|json|sql|md|css|html|example|npmrc)$/.test(file),
)

/** The lines of all files of text that match, as "file:line". */
function linesThatMatch(files: string[], pattern: RegExp): string[] {
  return files.flatMap((file) =>
    readFileSync(file, 'utf8')
      .split('\n')
      .flatMap((line, i) => (pattern.test(line) ? [`${file}:${i + 1}`] : [])),
  )
}

describe('what the project publishes', () => {
  it('holds no folder of the machine it was written on', () => {
    const home = new RegExp(`["'\`( ]/(${['work', 'root', 'home/[a-z]', 'Users'].join('|')})/`)
    expect(linesThatMatch(texts, home)).toEqual([])
  })

  it('takes packages from wherever npm is told to: no address stands in the lock file', () => {
    expect(linesThatMatch(['package-lock.json'], /"resolved": *"http/)).toEqual([])
  })

  it('locks every package by its checksum', () => {
    const { packages } = JSON.parse(readFileSync('package-lock.json', 'utf8')) as {
      packages: Record<string, { integrity?: string; link?: boolean; inBundle?: boolean }>
    }
    const unlocked = Object.entries(packages).filter(
      ([path, found]) => path !== '' && !found.integrity && !found.link && !found.inBundle,
    )
    expect(unlocked.map(([path]) => path)).toEqual([])
  })

  it('locks no package that nothing asks for', () => {
    expect(linesThatMatch(['package-lock.json'], /"extraneous"/)).toEqual([])
  })

  it('pins every package to one version, and the lock file agrees', () => {
    const read = (file: string) => JSON.parse(readFileSync(file, 'utf8')) as Manifest
    const { dependencies, devDependencies } = read('package.json')
    const all = Object.entries({ ...dependencies, ...devDependencies })
    expect(all.filter(([, version]) => !/^\d+\.\d+\.\d+$/.test(version))).toEqual([])
    const locked = (
      JSON.parse(readFileSync('package-lock.json', 'utf8')) as { packages: Record<string, Manifest> }
    ).packages['']
    expect({ ...locked?.dependencies, ...locked?.devDependencies }).toEqual(Object.fromEntries(all))
  })
})

interface Manifest {
  dependencies: Record<string, string>
  devDependencies: Record<string, string>
}
