/**
 * Makes many calls into few: while `run` is at work, or rests after it, further calls are remembered as one, and
 * it runs once more. What was asked for last is therefore always run after the asking.
 * @param rest how long to hold back after a run, so that a burst of calls does not read the same over and over
 */
export function coalesce(run: () => Promise<unknown>, rest: () => Promise<void>): () => Promise<void> {
  let working: Promise<void> | null = null
  let again = false
  const work = async () => {
    do {
      again = false
      await run()
      await rest()
    } while (again)
  }
  return () => {
    if (working) again = true
    working ??= work().finally(() => {
      working = null
    })
    return working
  }
}
