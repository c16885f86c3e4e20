/** Lets at most `count` pieces of work run at once, the others wait in line. */
export function slots(count: number): <T>(work: () => Promise<T>) => Promise<T> {
  let free = count
  const waiting: (() => void)[] = []
  const release = () => {
    const next = waiting.shift()
    if (next) next()
    else free++
  }
  return async (work) => {
    if (free > 0) free--
    else await new Promise<void>((resolve) => waiting.push(resolve))
    try {
      return await work()
    } finally {
      release()
    }
  }
}
