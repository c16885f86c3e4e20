import { existsSync, readFileSync, writeFileSync } from 'node:fs'
import { createServer } from 'node:net'
import { SetUpProblem } from './problem.mjs'

/** A loopback port that nothing listens on. */
export async function freePort() {
  const server = createServer()
  await new Promise((done, fail) => server.once('error', fail).listen(0, '127.0.0.1', () => done(undefined)))
  const address = server.address()
  await new Promise((done) => server.close(done))
  return typeof address === 'object' && address ? address.port : 0
}

/**
 * The port that a file names, while it is free: addresses that were given out go on working after a new start.
 * Otherwise a free one, which the file names from now on.
 * @param {string} file
 */
export async function lastingPort(file) {
  const kept = existsSync(file) ? Number(readFileSync(file, 'utf8')) : 0
  if (Number.isInteger(kept) && kept > 0 && (await portIsFree(kept))) return kept
  const port = await freePort()
  writeFileSync(file, String(port))
  return port
}

/**
 * Stops where a port that the product needs is somebody else's.
 * @param {number} port
 */
export async function refuseTakenPort(port) {
  if (await portIsFree(port)) return
  const other = port < 65535 ? port + 1 : port - 1
  throw new SetUpProblem(
    `Port ${port} is taken by another program: stop it, or choose another port, as in PORT=${other} npm start.`,
  )
}

/**
 * Whether a server may listen on a port, on all addresses.
 * @param {number} port
 * @returns {Promise<boolean>}
 */
function portIsFree(port) {
  return new Promise((done) => {
    const server = createServer()
    server.once('error', () => done(false))
    server.listen(port, () => server.close(() => done(true)))
  })
}
