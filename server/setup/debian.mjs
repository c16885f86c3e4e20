import { existsSync, mkdirSync, writeFileSync } from 'node:fs'
import { SetUpProblem, step } from './problem.mjs'
import { lastLines, run } from './run.mjs'

const clusterSettings = '/etc/postgresql-common/createcluster.d'
const noSystemCluster = 'create_main_cluster = false'

export const isRoot = process.getuid?.() === 0

/**
 * Installs Debian packages as root; anybody else is told the one line to run.
 * @param {string[]} packages
 * @param {string} what is missing, for the sentence
 */
export async function installFromDebian(packages, what) {
  if (!isRoot) {
    throw new SetUpProblem(
      `${what} not installed here. Run this line once as root, then start again:\n\n  ${adviceLine(packages)}\n`,
    )
  }
  if (!existsSync('/usr/bin/apt-get')) {
    throw new SetUpProblem(
      `${what} not installed, and this is not Debian: install ${packages.join(' and ')} and start again.`,
    )
  }
  step(`Installing from Debian: ${packages.join(', ')}`)
  if (packages.includes('postgresql')) refuseSystemCluster()
  await apt(['update'])
  await apt(['install', '-y', '--no-install-recommends', ...packages])
}

/** Debian's postgresql package would otherwise make and start a cluster of its own. */
function refuseSystemCluster() {
  mkdirSync(clusterSettings, { recursive: true })
  writeFileSync(`${clusterSettings}/underfoot.conf`, `${noSystemCluster}\n`)
}

/** @param {string[]} args */
async function apt(args) {
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' }
  const { code, output } = await run('apt-get', ['-q', '-o', 'DPkg::Lock::Timeout=120', ...args], { env })
  if (code !== 0) throw new SetUpProblem(`Debian's apt-get ${args[0]} failed:\n${lastLines(output)}`)
}

/** @param {string[]} packages */
function adviceLine(packages) {
  const install = `apt-get update && apt-get install -y --no-install-recommends ${packages.join(' ')}`
  if (!packages.includes('postgresql')) return install
  return `mkdir -p ${clusterSettings} && echo "${noSystemCluster}" > ${clusterSettings}/underfoot.conf && ${install}`
}
