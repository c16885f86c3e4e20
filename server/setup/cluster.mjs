import { spawn } from 'node:child_process'
import {
  chownSync,
  closeSync,
  existsSync,
  mkdtempSync,
  openSync,
  readFileSync,
  rmSync,
  writeFileSync,
} from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { answers, databaseUrl } from './database-urls.mjs'
import { endsWithStarter } from './parent-death.mjs'
import { pause } from './pause.mjs'
import { freePort } from './ports.mjs'
import { findPostgresPrograms, oldestVersion } from './postgres-programs.mjs'
import { runningServer, stopServer } from './postgres-server.mjs'
import { SetUpProblem } from './problem.mjs'
import { lastLines, run } from './run.mjs'

/**
 * A database server of our own; the password is the superuser's.
 * @typedef {object} Cluster
 * @property {string} folder
 * @property {string} log
 * @property {import('./server-user.mjs').ServerUser} user
 * @property {string} password
 * @property {Record<string, string>} [settings]
 *
 * @typedef {object} RunningCluster
 * @property {number} port
 * @property {string} adminUrl
 * @property {() => Promise<void>} stop
 */

const startSeconds = 30

/**
 * Loopback only, and no socket file: a long checkout path would be longer than a socket's name may be. The log of
 * changes is kept short: at its default of 1 GB it would weigh more than the demo club itself (230 MB).
 */
const fixedSettings = {
  listen_addresses: '127.0.0.1',
  unix_socket_directories: '',
  timezone: 'UTC',
  log_timezone: 'UTC',
  max_wal_size: '128MB',
}

/** @param {Cluster} cluster */
export function isMade(cluster) {
  return existsSync(join(cluster.folder, 'PG_VERSION'))
}

/**
 * Makes the cluster's files: UTF-8, sorted as English readers expect, passwords always asked for.
 * @param {Cluster} cluster
 */
export async function makeCluster(cluster) {
  const folder = mkdtempSync(join(tmpdir(), 'underfoot-password-'))
  const passwordFile = join(folder, 'password')
  try {
    writeFileSync(passwordFile, cluster.password, { mode: 0o600 })
    const { ids } = cluster.user
    if (ids) for (const path of [folder, passwordFile]) chownSync(path, ids.uid, ids.gid)
    const locale = ['--locale=C.UTF-8', '--locale-provider=icu', '--icu-locale=en-GB']
    const access = ['-U', 'postgres', '-A', 'scram-sha-256', `--pwfile=${passwordFile}`]
    const flags = ['-N', '-E', 'UTF8', ...locale, ...access, '-D', cluster.folder]
    const [program = '', ...args] = asServer(cluster, 'initdb', flags)
    const { code, output } = await run(program, args, { cwd: '/' })
    if (code !== 0) throw new SetUpProblem(`The database could not be made:\n${lastLines(output)}`)
  } finally {
    rmSync(folder, { recursive: true, force: true })
  }
}

/**
 * Starts the cluster, or takes over the server that a killed starter left running. A server that is still
 * shutting down is waited for.
 * @param {Cluster} cluster
 * @returns {Promise<RunningCluster>}
 */
export async function startCluster(cluster) {
  const end = Date.now() + startSeconds * 1000
  while (Date.now() < end) {
    const server = runningServer(cluster.folder)
    if (!server) return launch(cluster, end)
    const taken = asRunning(cluster, server.port)
    if (await answers(taken.adminUrl)) return taken
    await pause()
  }
  throw new SetUpProblem(`The database server neither answers nor ends; see ${cluster.log}.`)
}

/**
 * @param {Cluster} cluster
 * @param {number} end when to give up, in ms
 */
async function launch(cluster, end) {
  const port = await freePort()
  const settings = Object.entries({ ...fixedSettings, ...cluster.settings, port: String(port) })
  const flags = settings.flatMap(([name, value]) => ['-c', `${name}=${value}`])
  // The kernel forgets whom to signal when a process changes its user, so that comes after.
  const server = asServer(cluster, 'postgres', ['-D', cluster.folder, ...flags], endsWithStarter('INT'))
  const [program = '', ...args] = server
  const log = openSync(cluster.log, 'a')
  // A session of its own: Ctrl-C in the terminal must not stop the database before the product.
  const child = spawn(program, args, { cwd: '/', detached: true, stdio: ['ignore', log, log] })
  closeSync(log)
  let ended = false
  child.on('error', () => (ended = true)).on('exit', () => (ended = true))
  child.unref()
  const running = asRunning(cluster, port)
  while (!(await answers(running.adminUrl))) {
    if (ended || Date.now() > end) throw startProblem(cluster)
    await pause()
  }
  return running
}

/**
 * @param {Cluster} cluster
 * @param {number} port
 * @returns {RunningCluster}
 */
function asRunning(cluster, port) {
  const adminUrl = databaseUrl('postgres', cluster.password, port, 'postgres')
  return { port, adminUrl, stop: () => stopServer(cluster.folder) }
}

/** @param {Cluster} cluster */
function startProblem(cluster) {
  const log = lastLines(readFileSync(cluster.log, 'utf8'), 6)
  return new SetUpProblem(`The database server did not start. ${cluster.log} ends with:\n${log}`)
}

/**
 * The command line of one of PostgreSQL's programs, of the cluster's own version, as the server's user.
 * @param {Cluster} cluster
 * @param {string} program
 * @param {string[]} args
 * @param {string[]} [before] words before the program
 */
function asServer(cluster, program, args, before = []) {
  const version = isMade(cluster)
    ? Number(readFileSync(join(cluster.folder, 'PG_VERSION'), 'utf8'))
    : undefined
  const folder = findPostgresPrograms(version)
  if (!folder) {
    const needed = version ?? `${oldestVersion} or newer`
    throw new SetUpProblem(
      `The database in ${cluster.folder} needs PostgreSQL ${needed}, which is not installed.`,
    )
  }
  return [...cluster.user.prefix, ...before, join(folder, program), ...args]
}
