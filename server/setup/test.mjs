import { holdLock } from './lock.mjs'
import { checkNode, ensurePackages } from './packages.mjs'
import { localFolder } from './paths.mjs'
import { SetUpProblem, endWith } from './problem.mjs'
import { isStopping, stopAll, stopWhenAsked } from './stopping.mjs'

/** `npm test`: every check there is, from a fresh clone. `npm test -- unit lint` runs those two only. */
async function test() {
  checkNode()
  const { holder } = await holdLock(localFolder(), 'test')
  if (holder) throw new SetUpProblem(`The tests already run in this folder, as process ${holder}.`)
  stopWhenAsked({ exitCode: 130 })
  await ensurePackages()
  // Only now are the packages there that the rest is built on.
  const { runTests } = await import('./test-run.mjs')
  const allPassed = await runTests(process.argv.slice(2))
  await stopAll()
  process.exit(allPassed ? 0 : 1)
}

test().catch(async (error) => {
  const asked = isStopping()
  await stopAll()
  if (!asked) endWith(error)
})
