import { createServer } from 'node:net'

/** A loopback port that nothing listens on. */
export async function freePort() {
  const server = createServer()
  await new Promise((done, fail) => server.once('error', fail).listen(0, '127.0.0.1', () => done(undefined)))
  const address = server.address()
  await new Promise((done) => server.close(done))
  return typeof address === 'object' && address ? address.port : 0
}

/**
 * Whether a server may listen on a port, on all addresses.
 * @param {number} port
 * @returns {Promise<boolean>}
 */
export function portIsFree(port) {
  return new Promise((done) => {
    const server = createServer()
    server.once('error', () => done(false))
    server.listen(port, () => server.close(() => done(true)))
  })
}
