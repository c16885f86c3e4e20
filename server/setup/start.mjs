import { endLeftovers } from './leftovers.mjs'
import { holdLock } from './lock.mjs'
import { checkNode, ensurePackages } from './packages.mjs'
import { localFolder } from './paths.mjs'
import { refuseTakenPort } from './ports.mjs'
import { SetUpProblem, endWith } from './problem.mjs'
import { readSettings } from './settings.mjs'
import { isStopping, stopAll, stopWhenAsked } from './stopping.mjs'

/** `npm start`: from a fresh clone to the running product. `--dev` does the same and reloads what changes. */
async function start() {
  checkNode()
  const reload = process.argv.includes('--dev')
  const settings = readSettings(process.env)
  if (reload && settings.production) {
    throw new SetUpProblem('npm run dev is for development: unset NODE_ENV, or use npm start.')
  }
  const { holder } = await holdLock(localFolder(), 'start')
  if (holder) throw new SetUpProblem(`Underfoot already runs from this folder, as process ${holder}.`)
  stopWhenAsked({ exitCode: 0 })
  await endLeftovers()
  await refuseTakenPort(settings.port)
  await ensurePackages()
  // Only now are the packages there that the rest is built on.
  const { startProduct } = await import('./product.mjs')
  await startProduct(settings, { reload })
}

start().catch(async (error) => {
  const asked = isStopping()
  await stopAll()
  if (!asked) endWith(error)
})
