import { pause } from './pause.mjs'
import { SetUpProblem } from './problem.mjs'
import { isStopping } from './stopping.mjs'

const readySeconds = 60

/**
 * Waits until a web process says that it can serve.
 * @param {number} port
 */
export async function untilReady(port) {
  const end = Date.now() + readySeconds * 1000
  while (Date.now() < end && !isStopping()) {
    const response = await fetch(`http://127.0.0.1:${port}/readyz`).catch(() => undefined)
    if (response?.ok) return
    await pause(100)
  }
  throw new SetUpProblem(
    `The web process was not ready within ${readySeconds} s; .underfoot/web.log says why.`,
  )
}
