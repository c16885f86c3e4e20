/**
 * Makes many calls into few: while `run` is at work further calls are remembered as one, and it runs once more
 * when it is done. What was asked for last is therefore always run after the asking.
 */
export function coalesce(run: () => Promise<unknown>): () => Promise<void> {
  let working: Promise<void> | null = null
  let again = false
  const work = async () => {
    do {
      again = false
      await run()
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
