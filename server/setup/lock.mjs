import { statSync } from 'node:fs'
import { connect, createServer } from 'node:net'

/**
 * Holds a lock on a folder for as long as this process lives, and tells whoever else asks who holds it.
 * A name in Linux's abstract socket space: the kernel drops it with the process, so none is ever stale.
 * @param {string} folder
 * @param {string} purpose
 * @returns {Promise<{ holder?: string, release: () => void }>} the holder's process id where somebody else has it
 */
export async function holdLock(folder, purpose) {
  const { dev, ino } = statSync(folder)
  const name = `\0underfoot-${purpose}-${dev}-${ino}`
  const server = createServer((socket) => socket.end(String(process.pid)))
  const taken = await new Promise((done, fail) => {
    server.once('error', (/** @type {NodeJS.ErrnoException} */ error) =>
      error.code === 'EADDRINUSE' ? done(true) : fail(error),
    )
    server.listen(name, () => done(false))
  })
  server.unref()
  return taken ? { holder: await ask(name), release: () => undefined } : { release: () => server.close() }
}

/**
 * @param {string} name
 * @returns {Promise<string>}
 */
function ask(name) {
  return new Promise((done) => {
    let answer = ''
    const socket = connect(name)
    socket.on('data', (data) => (answer += data))
    socket.on('close', () => done(answer || 'unknown'))
    socket.on('error', () => done('unknown'))
  })
}
