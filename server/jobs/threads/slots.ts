/** Lets at most `count` pieces of work run at once; the others start in the order they came. */
export function createSlots(count: number) {
  let free = count
  const waiting: (() => void)[] = []
  const take = () => {
    if (free === 0) return new Promise<void>((resolve) => waiting.push(resolve))
    free -= 1
    return Promise.resolve()
  }
  const give = () => {
    const next = waiting.shift()
    if (next) next()
    else free += 1
  }
  return async <T>(work: () => Promise<T>): Promise<T> => {
    await take()
    try {
      return await work()
    } finally {
      give()
    }
  }
}
