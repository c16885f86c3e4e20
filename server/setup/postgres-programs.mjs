import { spawnSync } from 'node:child_process'
import { existsSync, readdirSync, realpathSync } from 'node:fs'
import { delimiter, dirname, join } from 'node:path'

/** The oldest version that takes ICU as a database's locale provider. */
export const oldestVersion = 15
const debianFolder = '/usr/lib/postgresql'

/**
 * The folder that holds `initdb` and `postgres`: Debian's versioned one (not on PATH), newest first, else PATH.
 * @param {number} [version] a cluster's own major version, which only the same programs can run
 * @returns {string | undefined}
 */
export function findPostgresPrograms(version) {
  return [...debianFolders(), ...foldersOnPath()].find((folder) => {
    const found = versionOf(folder)
    return version === undefined ? found >= oldestVersion : found === version
  })
}

function debianFolders() {
  if (!existsSync(debianFolder)) return []
  const versions = readdirSync(debianFolder).sort((a, b) => Number(b) - Number(a))
  return versions.map((version) => join(debianFolder, version, 'bin'))
}

function foldersOnPath() {
  return (process.env.PATH ?? '')
    .split(delimiter)
    .map((folder) => join(folder, 'initdb'))
    .filter((program) => existsSync(program))
    .map((program) => dirname(realpathSync(program)))
}

/**
 * The major version of the programs in a folder, 0 where they are not complete.
 * @param {string} folder
 */
function versionOf(folder) {
  if (!existsSync(join(folder, 'initdb'))) return 0
  const { stdout } = spawnSync(join(folder, 'postgres'), ['--version'], { encoding: 'utf8' })
  return Number(/\d+/.exec(stdout ?? '')?.[0] ?? 0)
}
